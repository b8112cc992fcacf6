import { DestroyRef, Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { Router } from '@angular/router';
import { STARTERS } from '@shared/design';
import { filter, firstValueFrom, take } from 'rxjs';
import { DesignsApi, type StoredDesign } from '../../core/designs/designs-api';
import { AdoptDrafts } from '../../core/drafts/adopt-drafts';
import { VISITOR_DRAFT } from '../../core/drafts/draft';
import { DraftStore } from '../../core/drafts/draft-store';
import { VisitorDrafts } from '../../core/drafts/visitor-drafts';
import { ProblemError } from '../../core/http/problem-error';
import { SessionStore } from '../../core/session/session-store';
import { DesignKeeper } from './design-keeper';

/** How far the editor is with getting a design onto the table. */
export type OpeningState =
  | { readonly status: 'loading' }
  | { readonly status: 'ready' }
  /** A visitor without a draft. */
  | { readonly status: 'empty' }
  | { readonly status: 'failed'; readonly why: 'offline' | 'signed-out' | 'gone' | 'server' };

/** Gets a design onto the table: from the server, or from what this browser kept. */
@Injectable()
export class Opening {
  private readonly keeper = inject(DesignKeeper);
  private readonly api = inject(DesignsApi);
  private readonly drafts = inject(DraftStore);
  private readonly visitorDrafts = inject(VisitorDrafts);
  private readonly adoption = inject(AdoptDrafts);
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly current = signal<OpeningState>({ status: 'loading' });
  private readonly sessionState$ = toObservable(this.session.state);
  /** Only the last opening asked for may put its design onto the table. */
  private turn = 0;

  readonly state = this.current.asReadonly();

  constructor() {
    // Whoever signs in with a draft on the table goes on with it as a design of the account.
    toObservable(this.session.account)
      .pipe(
        filter((account) => account !== undefined),
        takeUntilDestroyed(),
      )
      .subscribe(() => {
        if (this.current().status === 'failed') this.again();
      });
    inject(DestroyRef).onDestroy(() => (this.turn += 1));
  }

  private again: () => void = () => undefined;

  /** @param id of a stored design; undefined for the visitor's draft */
  open(id: string | undefined): void {
    this.again = () => this.open(id);
    this.turn += 1;
    const turn = this.turn;
    this.current.set({ status: 'loading' });
    const opening = id === undefined ? this.openDraft() : this.openStored(id);
    void opening.then((state) => {
      if (turn === this.turn) this.current.set(state);
    });
  }

  retry(): void {
    this.again();
  }

  /** A visitor begins with the stack of the plainest starter, and plans its steps. */
  async begin(): Promise<void> {
    const [plainest] = STARTERS;
    if (plainest) {
      const { bars, blank: _, note: __, ...rest } = plainest.design;
      await this.visitorDrafts.start({
        ...rest,
        name: 'New billet',
        bars: bars.map((bar) => ({ ...bar, steps: [] })),
      });
    }
    this.again();
  }

  private async openStored(id: string): Promise<OpeningState> {
    const turn = this.turn;
    const [draft, stored] = await Promise.all([this.drafts.get(id), this.fetch(id)]);
    if (turn !== this.turn) return { status: 'loading' };
    if (!(stored instanceof ProblemError)) {
      this.keeper.openStored(stored, draft);
      return { status: 'ready' };
    }
    if (draft !== undefined && stored.isOffline) {
      this.keeper.openOffline(draft);
      return { status: 'ready' };
    }
    if (stored.isOffline) return { status: 'failed', why: 'offline' };
    if (stored.status === 401) return { status: 'failed', why: 'signed-out' };
    return { status: 'failed', why: stored.status === 404 ? 'gone' : 'server' };
  }

  private async openDraft(): Promise<OpeningState> {
    const turn = this.turn;
    const session = await firstValueFrom(
      this.sessionState$.pipe(
        filter(({ status }) => status !== 'loading'),
        take(1),
      ),
    );
    const draft = await this.drafts.get(VISITOR_DRAFT);
    if (turn !== this.turn) return { status: 'loading' };
    if (session.status === 'member') {
      const { openId } = await this.adoption.adopt();
      await this.router.navigateByUrl(openId === undefined ? '/' : `/designs/${encodeURIComponent(openId)}`, {
        replaceUrl: true,
      });
      return { status: 'loading' };
    }
    if (draft === undefined) return { status: 'empty' };
    this.keeper.openVisitor(draft.key, draft.document, draft.history);
    return { status: 'ready' };
  }

  private async fetch(id: string): Promise<StoredDesign | ProblemError> {
    try {
      return await firstValueFrom(this.api.get(id));
    } catch (error) {
      if (error instanceof ProblemError) return error;
      throw error;
    }
  }
}
