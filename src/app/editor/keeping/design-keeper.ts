import { DOCUMENT, DestroyRef, Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import type { Design } from '@shared/design';
import {
  EMPTY,
  type Observable,
  Subject,
  auditTime,
  catchError,
  concatMap,
  defer,
  filter,
  firstValueFrom,
  fromEvent,
  map,
  merge,
  of,
  timeout,
} from 'rxjs';
import { DesignsApi, type SaveResult, type StoredDesign } from '../../core/designs/designs-api';
import type { Draft } from '../../core/drafts/draft';
import { DraftStore } from '../../core/drafts/draft-store';
import { ConnectionStore } from '../../core/http/connection-store';
import { ProblemError } from '../../core/http/problem-error';
import { SessionStore } from '../../core/session/session-store';
import { DesignStore } from '../design-store';
import { DraftWriter } from './draft-writer';
import { type KeepState, keepWords } from './keep-state';
import { isSameDocument } from './same-document';

/** How long after a change its save begins, ms; with the request itself it stays well under 2 s. */
export const SAVE_AFTER_MS = 1000;

/** How long a reader waits for a save before printing, ms. */
const PATIENCE_MS = 8000;

/** What the open document is kept as. */
interface Keeping {
  /** Key of the draft: the design's id, or the visitor's. */
  readonly key: string;
  /** The revision that the work began from; null for a design that no server has. */
  readonly base: {
    readonly revision: number;
    readonly etag: string;
    /** Its document; null while it is not known here. */
    readonly document: Design | null;
  } | null;
}

/**
 * Keeps the open design: every change goes into the browser's draft at once and to the server within two seconds, one
 * save after the other, each over the revision that it was made from and over no other.
 */
@Injectable()
export class DesignKeeper {
  private readonly store = inject(DesignStore);
  private readonly api = inject(DesignsApi);
  private readonly drafts = inject(DraftStore);
  private readonly writer = inject(DraftWriter);
  private readonly session = inject(SessionStore);
  private readonly connection = inject(ConnectionStore);

  private readonly keeping = signal<Keeping | null>(null);
  private readonly current = signal<KeepState>({ kind: 'browser' });
  private readonly saveSoon = new Subject<void>();
  private readonly saveNow = new Subject<void>();

  readonly state = this.current.asReadonly();
  private readonly state$ = toObservable(this.current);
  /** The stored design's id; null for a visitor's. */
  readonly designId = computed(() => {
    const keeping = this.keeping();
    return keeping?.base ? keeping.key : null;
  });
  private readonly isKeptInBrowser = computed(() => this.drafts.keeping() !== 'memory');
  readonly words = computed(() => keepWords(this.state(), this.isKeptInBrowser()));
  /** Whether closing the page would lose work. */
  readonly wouldLose = computed(() => !this.isKeptInBrowser() && this.state().kind !== 'saved');

  constructor() {
    effect(() => {
      const history = this.store.history();
      untracked(() => this.changed(history.present));
    });
    merge(this.saveSoon.pipe(auditTime(SAVE_AFTER_MS)), this.saveNow)
      .pipe(concatMap(() => this.save()))
      .subscribe();
    // Back online, or signed in again: what waited is saved.
    merge(
      toObservable(this.connection.isOnline).pipe(filter(Boolean)),
      toObservable(this.session.account).pipe(filter((account) => account !== undefined)),
    )
      .pipe(takeUntilDestroyed())
      .subscribe(() => {
        if (['offline', 'signed-out'].includes(this.state().kind)) this.saveNow.next();
      });
    const document = inject(DOCUMENT);
    fromEvent(document, 'visibilitychange')
      .pipe(takeUntilDestroyed())
      .subscribe(() => {
        if (document.visibilityState !== 'hidden') return;
        this.writer.hurry();
        this.saveNow.next();
      });
    inject(DestroyRef).onDestroy(() => {
      // A save under way is let finish; what is left is started.
      this.saveNow.next();
      this.saveSoon.complete();
      this.saveNow.complete();
    });
  }

  /** Begins with a design that no server has. */
  openVisitor(key: string, design: Design, history: Draft['history']): void {
    this.keeping.set({ key, base: null });
    this.current.set({ kind: 'browser' });
    this.store.open(design, history);
  }

  /** Begins with the server's copy, or with work on it that this browser kept. */
  openStored(stored: StoredDesign, draft: Draft | undefined): void {
    const base = { revision: stored.revision, etag: stored.etag, document: stored.document };
    this.keeping.set({ key: stored.id, base });
    if (draft === undefined) {
      this.current.set({ kind: 'saved' });
      this.store.open(stored.document);
    } else if (isSameDocument(draft.document, stored.document)) {
      this.current.set({ kind: 'saved' });
      this.store.open(stored.document, draft.history);
    } else if (draft.isSaved) {
      // Nothing of ours is unsaved and someone else went on: theirs, and no undo that would take it back.
      this.current.set({ kind: 'saved' });
      this.store.open(stored.document);
    } else {
      const isSameBase = draft.base?.etag === stored.etag;
      this.current.set(isSameBase ? { kind: 'unsaved' } : { kind: 'conflict', theirs: stored });
      this.store.open(draft.document, draft.history);
      if (isSameBase) this.saveNow.next();
    }
  }

  /** Begins with what this browser kept while the server can't be reached. */
  openOffline(draft: Draft): void {
    this.keeping.set({
      key: draft.key,
      base: draft.base && { ...draft.base, document: draft.isSaved ? draft.document : null },
    });
    this.current.set({ kind: 'offline' });
    this.store.open(draft.document, draft.history);
  }

  /**
   * Saves what there is to save.
   * @returns whether the server has everything then; false too when it takes longer than a reader waits
   */
  async whenSaved(): Promise<boolean> {
    if (this.state().kind === 'saved') return true;
    this.retry();
    const settled$ = this.state$.pipe(
      filter(({ kind }) => kind !== 'saving' && kind !== 'unsaved'),
      timeout({ first: PATIENCE_MS, with: () => of(null) }),
    );
    return (await firstValueFrom(settled$))?.kind === 'saved';
  }

  /** Tries again at once. */
  retry(): void {
    if (this.state().kind === 'refused') this.current.set({ kind: 'unsaved' });
    this.saveNow.next();
  }

  /** Conflict: my document goes over theirs. */
  keepMine(): void {
    const state = this.state();
    const keeping = this.keeping();
    if (state.kind !== 'conflict' || !state.theirs || !keeping) return;
    const { revision, etag, document } = state.theirs;
    this.keeping.set({ key: keeping.key, base: { revision, etag, document } });
    this.current.set({ kind: 'unsaved' });
    this.saveNow.next();
  }

  /** Conflict: their document is the one to go on with; undo begins anew, so that it can't take back their work. */
  keepTheirs(): void {
    const state = this.state();
    if (state.kind === 'conflict' && state.theirs) this.openStored(state.theirs, undefined);
  }

  /** Mine becomes a design of its own; the stored one stays as it is. The caller goes to it. */
  keepAsCopy(name: string): Observable<StoredDesign> {
    const key = this.keeping()?.key;
    return this.api.create({ ...this.store.design(), name }).pipe(
      concatMap(async (copy) => {
        this.keeping.set(null);
        if (key !== undefined) await this.writer.remove(key);
        return copy;
      }),
    );
  }

  /** Every change, as soon as it is made. */
  private changed(design: Design): void {
    const keeping = this.keeping();
    if (!keeping) return;
    const { base } = keeping;
    const isSaved = base !== null && design === base.document;
    this.writer.write(() => this.draft(keeping.key));
    if (base === null || this.state().kind === 'conflict') return;
    if (isSaved) {
      if (this.state().kind === 'unsaved') this.current.set({ kind: 'saved' });
      return;
    }
    if (['saved', 'refused'].includes(this.state().kind)) this.current.set({ kind: 'unsaved' });
    this.saveSoon.next();
  }

  private draft(key: string): Draft {
    const { past, present, future } = this.store.history();
    const base = this.keeping()?.base ?? null;
    return {
      key,
      document: present,
      history: { past, future },
      base: base && { revision: base.revision, etag: base.etag },
      isSaved: base !== null && base.document === present,
      savedAt: new Date().toISOString(),
    };
  }

  /** One save of what there is to save, when its turn comes. */
  private save(): Observable<void> {
    return defer(() => {
      const keeping = this.keeping();
      const document = this.store.design();
      const isStuck = ['conflict', 'gone', 'refused'].includes(this.state().kind);
      if (!keeping?.base || isStuck || document === keeping.base.document) return EMPTY;
      this.current.set({ kind: 'saving' });
      return this.api
        .save(keeping.key, document, keeping.base.etag)
        .pipe(concatMap((result) => this.settle(keeping.key, document, result)));
    });
  }

  private settle(key: string, document: Design, result: SaveResult): Observable<void> {
    // Another design was opened meanwhile.
    if (this.keeping()?.key !== key) return EMPTY;
    switch (result.kind) {
      case 'saved': {
        const { revision, etag } = result.design;
        this.based(key, { revision, etag, document });
        return EMPTY;
      }
      case 'conflict':
        return this.meet(key, document);
      default:
        this.current.set(result);
        return EMPTY;
    }
  }

  /** The server has another revision: it is fetched, and no conflict if it says what was to be saved anyway. */
  private meet(key: string, document: Design): Observable<void> {
    this.current.set({ kind: 'conflict', theirs: null });
    return this.api.get(key).pipe(
      map((theirs): void => {
        if (isSameDocument(theirs.document, document)) {
          this.based(key, { revision: theirs.revision, etag: theirs.etag, document });
        } else {
          this.current.set({ kind: 'conflict', theirs });
        }
      }),
      catchError((error: unknown) => {
        if (!(error instanceof ProblemError)) throw error;
        this.current.set(stateOf(error));
        return EMPTY;
      }),
    );
  }

  private based(key: string, base: NonNullable<Keeping['base']>): void {
    this.keeping.set({ key, base });
    const isAll = this.store.design() === base.document;
    this.current.set({ kind: isAll ? 'saved' : 'unsaved' });
    this.writer.write(() => this.draft(key));
    if (!isAll) this.saveSoon.next();
  }
}

function stateOf(problem: ProblemError): KeepState {
  if (problem.isOffline) return { kind: 'offline' };
  if (problem.status === 401) return { kind: 'signed-out' };
  return problem.status === 404 ? { kind: 'gone' } : { kind: 'refused', problem };
}
