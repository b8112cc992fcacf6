import { DOCUMENT, Injectable, inject } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MatSnackBar } from '@angular/material/snack-bar';
import { saveAs } from 'file-saver';
import { UnitsStore } from '../../core/units/units-store';
import { DesignStore } from '../design-store';
import { FileProblemsDialog, type FileProblems } from '../dialogs/file-problems-dialog';
import { DesignKeeper } from '../keeping/design-keeper';
import { LARGEST_FILE_BYTES, designFileName, designFileText, readDesignFile } from './design-file';

/** The sheets that can be printed. */
export type Sheet = 'card' | 'cut-sheet';
export type Paper = 'a5' | 'half-letter';

/** Takes the design out of the program and back in: the file, the printed sheets. */
@Injectable()
export class InAndOut {
  private readonly store = inject(DesignStore);
  private readonly keeper = inject(DesignKeeper);
  private readonly units = inject(UnitsStore);
  private readonly dialog = inject(MatDialog);
  private readonly snackBar = inject(MatSnackBar);
  private readonly window = inject(DOCUMENT).defaultView;

  /** Saves the design as a file on this device. */
  download(): void {
    const design = this.store.design();
    saveAs(new Blob([designFileText(design)], { type: 'application/json' }), designFileName(design));
  }

  /** Takes a design file in as an edit that can be undone; what is wrong with it is said field by field. */
  async take(file: File): Promise<void> {
    const read =
      file.size > LARGEST_FILE_BYTES
        ? {
            ok: false as const,
            isNewer: false,
            problems: [{ path: [], code: 'too-large', message: 'This file is larger than any design.' }],
          }
        : readDesignFile(await file.text());
    if (!read.ok) {
      const data: FileProblems = { fileName: file.name, isNewer: read.isNewer, problems: read.problems };
      this.dialog.open(FileProblemsDialog, { data, maxWidth: 'min(760px, 96vw)' });
      return;
    }
    this.store.edit(() => read.design);
    this.snackBar
      .open(`${file.name} is on the table`, 'Undo', { duration: 8000 })
      .onAction()
      .subscribe(() => this.store.undo());
  }

  /** Opens a sheet of the design as it is now; what is not saved yet is saved first. */
  async print(sheet: Sheet, paper: Paper): Promise<void> {
    const id = this.keeper.designId();
    if (id === null) return;
    if (!(await this.keeper.whenSaved())) {
      this.snackBar.open('Not printed: the latest changes could not be saved.', undefined, {
        duration: 8000,
      });
      return;
    }
    const query = `paper=${paper}&units=${this.units.system()}`;
    this.window?.open(`/api/designs/${encodeURIComponent(id)}/${sheet}.pdf?${query}`, '_blank', 'noopener');
  }
}
