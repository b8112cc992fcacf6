import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import type { Draft } from '../core/drafts/draft';
import { VisitorDrafts } from '../core/drafts/visitor-drafts';
import { Moment } from './moment';

/** Designs that only this browser has: go on with one, or throw it away. */
@Component({
  selector: 'lw-draft-list',
  imports: [MatButton, MatIcon, MatIconButton, Moment],
  templateUrl: './draft-list.html',
  styleUrl: './draft-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DraftList {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  protected readonly visitor = inject(VisitorDrafts);
  /** Whether there is an account that could take them. */
  readonly canKeep = input(false);
  readonly keep = output();

  protected async open(draft: Draft): Promise<void> {
    await this.visitor.takeUp(draft.key);
    await this.router.navigateByUrl('/draft');
  }

  protected async remove(draft: Draft): Promise<void> {
    await this.visitor.remove(draft.key);
    this.snackBar
      .open(`Deleted “${draft.document.name}”`, 'Undo', { duration: 10_000 })
      .onAction()
      .subscribe(() => void this.visitor.putBack(draft));
  }
}
