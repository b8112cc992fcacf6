import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Design } from '@shared/design';
import { map, type Observable, switchMap, tap } from 'rxjs';
import { type DesignListItem, DesignsApi, type StoredDesign } from '../core/designs/designs-api';

export type BenchState =
  | { readonly status: 'loading' }
  | { readonly status: 'ready'; readonly designs: readonly DesignListItem[] }
  | { readonly status: 'failed'; readonly error: unknown };

export const BENCH_ORDERS = ['changed', 'name'] as const;
export type BenchOrder = (typeof BENCH_ORDERS)[number];

/** A member's designs, as the bench shows them. */
@Injectable()
export class BenchStore {
  private readonly api = inject(DesignsApi);
  private readonly destroyed = inject(DestroyRef);
  private readonly current = signal<BenchState>({ status: 'loading' });

  readonly state = this.current.asReadonly();
  readonly query = signal('');
  readonly order = signal<BenchOrder>('changed');
  readonly shown = computed(() => {
    const state = this.current();
    return state.status === 'ready' ? sorted(found(state.designs, this.query()), this.order()) : [];
  });

  load(): void {
    this.current.set({ status: 'loading' });
    this.fetch();
  }

  create(document: Design): Observable<StoredDesign> {
    return this.api.create(document);
  }

  /** A copy beside the original. */
  duplicate(item: DesignListItem): Observable<StoredDesign> {
    return this.api.get(item.id).pipe(
      switchMap(({ document }) => this.api.create({ ...document, name: this.copyName(document.name) })),
      tap(() => this.fetch()),
    );
  }

  /** Gone from the list at once, and back in it if the server refuses. */
  delete(item: DesignListItem): Observable<void> {
    this.change((designs) => designs.filter(({ id }) => id !== item.id));
    return this.api.get(item.id).pipe(
      switchMap(({ etag }) => this.api.delete(item.id, etag)),
      tap({ error: () => this.fetch() }),
    );
  }

  restore(item: DesignListItem): Observable<void> {
    return this.api.restore(item.id).pipe(
      tap(() => this.fetch()),
      map(() => undefined),
    );
  }

  /** Anew from the server; what is on the screen stays until the answer is there. */
  private fetch(): void {
    this.api
      .list()
      .pipe(takeUntilDestroyed(this.destroyed))
      .subscribe({
        next: (designs) => this.current.set({ status: 'ready', designs }),
        error: (error: unknown) => this.current.set({ status: 'failed', error }),
      });
  }

  private change(update: (designs: readonly DesignListItem[]) => readonly DesignListItem[]): void {
    this.current.update((state) =>
      state.status === 'ready' ? { status: 'ready', designs: update(state.designs) } : state,
    );
  }

  private copyName(name: string): string {
    const state = this.current();
    const taken = new Set(state.status === 'ready' ? state.designs.map((design) => design.name) : []);
    const base = name.replace(/ \(copy(?: \d+)?\)$/, '').slice(0, 100);
    let copy = `${base} (copy)`;
    for (let number = 2; taken.has(copy); number++) copy = `${base} (copy ${number})`;
    return copy;
  }
}

function found(designs: readonly DesignListItem[], query: string): readonly DesignListItem[] {
  const words = plain(query).split(/\s+/).filter(Boolean);
  return designs.filter(({ name }) => words.every((word) => plain(name).includes(word)));
}

function sorted(designs: readonly DesignListItem[], order: BenchOrder): readonly DesignListItem[] {
  return [...designs].sort((a, b) =>
    order === 'name'
      ? a.name.localeCompare(b.name, undefined, { numeric: true })
      : b.updatedAt.localeCompare(a.updatedAt),
  );
}

/** Without case and accents. */
function plain(text: string): string {
  return text.normalize('NFD').replace(/\p{M}/gu, '').toLocaleLowerCase();
}
