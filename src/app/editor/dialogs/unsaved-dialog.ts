import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';

/** Why a design is not being saved. */
export interface Unsaved {
  readonly why: 'gone' | 'refused';
  /** What the server found wrong. */
  readonly issues: readonly string[];
}

export type UnsavedAnswer = 'copy' | 'retry';

/** Says why the design is not being saved and what can be done; the work stays on the table either way. */
@Component({
  selector: 'lw-unsaved-dialog',
  imports: [MatButtonModule, MatDialogModule],
  templateUrl: './unsaved-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnsavedDialog {
  protected readonly unsaved = inject<Unsaved>(MAT_DIALOG_DATA);
}
