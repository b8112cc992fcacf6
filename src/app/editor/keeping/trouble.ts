import { Injectable, inject } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { problemWords } from '../../core/errors/problem-words';
import { ProblemError } from '../../core/http/problem-error';
import { DesignStore } from '../design-store';
import { type Conflict, type ConflictAnswer, ConflictDialog } from '../dialogs/conflict-dialog';
import { type Unsaved, type UnsavedAnswer, UnsavedDialog } from '../dialogs/unsaved-dialog';
import { DesignKeeper } from './design-keeper';

/** Sees to what keeps the design from being saved, with the reader. */
@Injectable()
export class Trouble {
  private readonly store = inject(DesignStore);
  private readonly keeper = inject(DesignKeeper);
  private readonly dialog = inject(MatDialog);
  private readonly snackBar = inject(MatSnackBar);
  private readonly router = inject(Router);
  private isOpen = false;

  async seeTo(): Promise<void> {
    if (this.isOpen) return;
    this.isOpen = true;
    try {
      await this.open();
    } finally {
      this.isOpen = false;
    }
  }

  private async open(): Promise<void> {
    const state = this.keeper.state();
    switch (state.kind) {
      case 'conflict':
        if (state.theirs === null) this.keeper.retry();
        else
          await this.settle({
            mine: this.store.design(),
            theirs: state.theirs.document,
            savedAt: state.theirs.updatedAt,
          });
        break;
      case 'signed-out':
        await this.router.navigate(['/account/sign-in'], { queryParams: { to: this.router.url } });
        break;
      case 'gone':
        await this.explain({ why: 'gone', issues: [] });
        break;
      case 'refused':
        await this.explain({ why: 'refused', issues: issuesOf(state.problem) });
        break;
      default:
    }
  }

  private async settle(data: Conflict): Promise<void> {
    const dialog = this.dialog.open<ConflictDialog, Conflict, ConflictAnswer>(ConflictDialog, {
      data,
      maxWidth: 'min(900px, 96vw)',
      autoFocus: 'dialog',
    });
    switch (await firstValueFrom(dialog.afterClosed(), { defaultValue: undefined })) {
      case 'mine':
        this.keeper.keepMine();
        break;
      case 'theirs':
        this.keeper.keepTheirs();
        break;
      case 'copy':
        await this.copy(`${data.mine.name.slice(0, 100)} (mine)`);
        break;
      case undefined:
    }
  }

  private async explain(data: Unsaved): Promise<void> {
    const dialog = this.dialog.open<UnsavedDialog, Unsaved, UnsavedAnswer>(UnsavedDialog, {
      data,
      maxWidth: 'min(640px, 96vw)',
    });
    const answer = await firstValueFrom(dialog.afterClosed(), { defaultValue: undefined });
    if (answer === 'copy') await this.copy(this.store.design().name);
    if (answer === 'retry') this.keeper.retry();
  }

  private async copy(name: string): Promise<void> {
    try {
      const { id } = await firstValueFrom(this.keeper.keepAsCopy(name));
      await this.router.navigate(['/designs', id]);
      this.snackBar.open(`Kept as “${name}”`, undefined, { duration: 8000 });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      this.snackBar.open(`Not copied. ${problemWords(error)}`, undefined, { duration: 8000 });
    }
  }
}

function issuesOf(problem: ProblemError): readonly string[] {
  const issues = problem.issues.map(({ pointer, message }) => (pointer ? `${pointer}: ${message}` : message));
  return issues.length > 0 ? issues : [problemWords(problem)];
}
