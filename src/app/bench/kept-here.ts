import { computed, inject, Injectable, signal } from '@angular/core';
import type { Draft } from '../core/drafts/draft';
import { DraftStore } from '../core/drafts/draft-store';

/** What this browser has of designs that lie on the server: copies to work on offline, and changes not yet saved. */
@Injectable({ providedIn: 'root' })
export class KeptHere {
  private readonly store = inject(DraftStore);
  private readonly kept = signal<readonly Draft[]>([]);

  /** Last changed first. */
  readonly designs = this.kept.asReadonly();
  /** Ids of those with changes that the server does not have. */
  readonly unsavedIds = computed(
    (): ReadonlySet<string> => new Set(this.kept().flatMap(({ key, isSaved }) => (isSaved ? [] : [key]))),
  );

  async load(): Promise<void> {
    const drafts = await this.store.list();
    this.kept.set(drafts.filter(({ base }) => base !== null));
  }
}
