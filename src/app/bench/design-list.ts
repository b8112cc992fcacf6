import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  Injector,
  signal,
  viewChild,
  viewChildren,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatFormField, MatLabel, MatPrefix, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import type { Starter } from '@shared/design';
import type { DesignListItem } from '../core/designs/designs-api';
import { AdoptDrafts } from '../core/drafts/adopt-drafts';
import { VisitorDrafts } from '../core/drafts/visitor-drafts';
import { problemWords } from '../core/errors/problem-words';
import { BenchStore } from './bench-store';
import { DesignCard } from './design-card';
import { DraftList } from './draft-list';
import { FailedPanel } from './failed-panel';
import { KeptHere } from './kept-here';
import { KeptList } from './kept-list';
import { StarterGallery } from './starter-gallery';

/** A member's designs: find, open, begin, copy and throw away. */
@Component({
  selector: 'lw-design-list',
  imports: [
    DesignCard,
    DraftList,
    FailedPanel,
    KeptList,
    MatButton,
    MatFormField,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatOption,
    MatPrefix,
    MatSelect,
    MatSuffix,
    StarterGallery,
  ],
  providers: [BenchStore],
  templateUrl: './design-list.html',
  styleUrl: './design-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DesignList {
  private readonly injector = inject(Injector);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly snackBar = inject(MatSnackBar);
  private readonly adoption = inject(AdoptDrafts);
  protected readonly store = inject(BenchStore);
  protected readonly visitor = inject(VisitorDrafts);
  protected readonly kept = inject(KeptHere);

  private readonly cards = viewChildren(DesignCard);
  private readonly title = viewChild.required<ElementRef<HTMLElement>>('title');

  protected readonly isStarting = signal(false);
  protected readonly failure = computed(() => {
    const state = this.store.state();
    return state.status === 'failed' ? problemWords(state.error) : undefined;
  });
  protected readonly count = computed(() => {
    const state = this.store.state();
    if (state.status !== 'ready') return '';
    const [shown, all] = [this.store.shown().length, state.designs.length];
    const designs = all === 1 ? 'design' : 'designs';
    return shown === all ? `${all} ${designs}` : `${shown} of ${all} ${designs}`;
  });

  constructor() {
    this.store.load();
    void this.visitor.load();
    void this.kept.load();
  }

  protected async openStarters(): Promise<void> {
    const { NewDesignDialog } = await import('./new-design-dialog');
    this.dialog
      .open<unknown, undefined, Starter>(NewDesignDialog, { width: '1120px', maxWidth: 'calc(100vw - 16px)' })
      .afterClosed()
      .subscribe((starter) => {
        if (starter) this.start(starter);
      });
  }

  protected start(starter: Starter): void {
    if (this.isStarting()) return;
    this.isStarting.set(true);
    this.store.create(starter.design).subscribe({
      next: ({ id }) => void this.router.navigate(['/designs', id]),
      error: (error: unknown) => {
        this.isStarting.set(false);
        this.tellFailure('Not made', error);
      },
    });
  }

  protected duplicate(item: DesignListItem): void {
    this.store.duplicate(item).subscribe({
      next: ({ document }) => this.snackBar.open(`Made “${document.name}”`, undefined, { duration: 5_000 }),
      error: (error: unknown) => this.tellFailure('Not copied', error),
    });
  }

  protected delete(item: DesignListItem): void {
    const place = this.store.shown().indexOf(item);
    const deleting = this.store.delete(item);
    this.focusNear(place);
    deleting.subscribe({
      next: () => {
        this.snackBar
          .open(`Deleted “${item.name}”`, 'Undo', { duration: 10_000 })
          .onAction()
          .subscribe(() => this.restore(item));
      },
      error: (error: unknown) => this.tellFailure('Not deleted', error),
    });
  }

  /** Drafts made before there was an account, or while its server was away. */
  protected async keepDrafts(): Promise<void> {
    const { saved, left } = await this.adoption.adopt();
    this.store.load();
    this.snackBar.open(
      left === 0 ? `${saved} saved to the bench` : `${saved} saved, ${left} not taken: try again later`,
      undefined,
      { duration: 8_000 },
    );
  }

  /** What had the keyboard's focus is gone: it goes to the design that took its place. */
  private focusNear(place: number): void {
    afterNextRender(
      () => {
        const cards = this.cards();
        const near = cards[Math.min(place, cards.length - 1)];
        if (near) near.focus();
        else this.title().nativeElement.focus();
      },
      { injector: this.injector },
    );
  }

  private restore(item: DesignListItem): void {
    this.store.restore(item).subscribe({
      error: (error: unknown) => this.tellFailure('Not brought back', error),
    });
  }

  private tellFailure(what: string, error: unknown): void {
    this.snackBar.open(`${what}. ${problemWords(error)}`, 'Close', { duration: 15_000 });
  }
}
