import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import type { DesignProblem } from '@shared/design';
import { pathWords } from '../in-and-out/design-file';

/** A file that could not be taken in. */
export interface FileProblems {
  readonly fileName: string;
  readonly isNewer: boolean;
  readonly problems: readonly DesignProblem[];
}

/** Problems listed at most; a file that is all wrong is as wrong with fifty. */
const MOST_LISTED = 50;

/** What is wrong with a design file, field by field. The design on the table was left as it is. */
@Component({
  selector: 'lw-file-problems-dialog',
  imports: [MatButtonModule, MatDialogModule],
  templateUrl: './file-problems-dialog.html',
  styleUrl: './conflict-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileProblemsDialog {
  protected readonly file = inject<FileProblems>(MAT_DIALOG_DATA);
  protected readonly listed = this.file.problems.slice(0, MOST_LISTED);
  protected readonly more = this.file.problems.length - this.listed.length;
  protected readonly path = pathWords;
}
