import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import type { Design } from '@shared/design';
import { UnitsStore } from '../../core/units/units-store';
import { differencesOf } from '../keeping/differences';

/** Two versions of one design, each saved by someone who did not know of the other. */
export interface Conflict {
  readonly mine: Design;
  readonly theirs: Design;
  /** When theirs was saved; UTC, ISO 8601. */
  readonly savedAt: string;
}

export type ConflictAnswer = 'mine' | 'theirs' | 'copy';

/** Shows what differs and asks which of the two to go on with; nothing is lost by leaving it open. */
@Component({
  selector: 'lw-conflict-dialog',
  imports: [MatButtonModule, MatDialogModule],
  templateUrl: './conflict-dialog.html',
  styleUrl: './conflict-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictDialog {
  protected readonly conflict = inject<Conflict>(MAT_DIALOG_DATA);
  private readonly units = inject(UnitsStore);

  protected readonly differences = computed(() =>
    differencesOf(this.conflict.mine, this.conflict.theirs, this.units.format()),
  );
  protected readonly savedAt = new Date(this.conflict.savedAt);
  protected readonly when = this.savedAt.toLocaleString(undefined, {
    dateStyle: 'medium',
    timeStyle: 'short',
  });
}
