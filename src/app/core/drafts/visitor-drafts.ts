import { DOCUMENT, inject, Injectable, signal } from '@angular/core';
import type { Design } from '@shared/design';
import { type Draft, VISITOR_DRAFT } from './draft';
import { DraftStore } from './draft-store';

const SHELVED = `${VISITOR_DRAFT}:`;

/**
 * Designs made without an account. One is on the anvil (`/draft` opens it); starting another lays it aside, so that
 * nothing is ever overwritten.
 */
@Injectable({ providedIn: 'root' })
export class VisitorDrafts {
  private readonly store = inject(DraftStore);
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly all = signal<readonly Draft[] | undefined>(undefined);

  /** Last saved first; undefined until they were read. */
  readonly drafts = this.all.asReadonly();

  async load(): Promise<void> {
    const drafts = await this.store.list();
    this.all.set(drafts.filter(({ key }) => isVisitors(key)));
  }

  /** Puts a new design on the anvil. */
  async start(document: Design): Promise<void> {
    await this.layAside();
    await this.store.put({
      key: VISITOR_DRAFT,
      document,
      history: null,
      base: null,
      savedAt: new Date().toISOString(),
    });
    await this.load();
  }

  /** Puts a draft that was laid aside on the anvil again. */
  async takeUp(key: string): Promise<void> {
    if (key === VISITOR_DRAFT) return;
    const draft = await this.store.get(key);
    if (draft === undefined) return;
    await this.layAside();
    // Its old place is cleared only when it lies in the new one: a crash in between leaves two, never none.
    await this.store.put({ ...draft, key: VISITOR_DRAFT });
    await this.store.remove(key);
    await this.load();
  }

  async remove(key: string): Promise<void> {
    await this.store.remove(key);
    await this.load();
  }

  /** Brings back what `remove` took. */
  async putBack(draft: Draft): Promise<void> {
    const isTaken = (await this.store.get(draft.key)) !== undefined;
    await this.store.put(isTaken ? { ...draft, key: this.freeKey() } : draft);
    await this.load();
  }

  private async layAside(): Promise<void> {
    const current = await this.store.get(VISITOR_DRAFT);
    if (current !== undefined) await this.store.put({ ...current, key: this.freeKey() });
  }

  private freeKey(): string {
    const random = this.window?.crypto.getRandomValues(new Uint32Array(2)) ?? [];
    return SHELVED + Array.from(random, (part) => part.toString(36)).join('');
  }
}

function isVisitors(key: string): boolean {
  return key === VISITOR_DRAFT || key.startsWith(SHELVED);
}
