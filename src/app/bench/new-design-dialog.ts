import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import type { Starter } from '@shared/design';
import { StarterGallery } from './starter-gallery';

/** Asks which starter the new design begins with; closes with it, or with nothing. */
@Component({
  selector: 'lw-new-design-dialog',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, StarterGallery],
  template: `
    <h2 mat-dialog-title>New design</h2>
    <mat-dialog-content>
      <p>Begin with the pattern that comes nearest: every layer and step can be changed.</p>
      <lw-starter-gallery (chosen)="dialog.close($event)" />
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button type="button" mat-button mat-dialog-close>Cancel</button>
    </mat-dialog-actions>
  `,
  styles: `
    mat-dialog-content {
      max-height: 68dvh;
    }
    p {
      padding-bottom: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewDesignDialog {
  protected readonly dialog = inject<MatDialogRef<NewDesignDialog, Starter>>(MatDialogRef);
}
