import { InjectionToken } from '@angular/core';
import { type DBSchema, openDB } from 'idb';
import type { Draft } from './draft';

/** A place that drafts are put in by key. */
export interface DraftShelf {
  get(key: string): Promise<Draft | undefined>;
  list(): Promise<readonly Draft[]>;
  put(draft: Draft): Promise<void>;
  remove(key: string): Promise<void>;
}

interface DraftDatabase extends DBSchema {
  drafts: { key: string; value: Draft };
}

/** Opens the shelf that survives a reload; fails where the browser has none for us. */
export const DRAFT_SHELVES = new InjectionToken<() => Promise<DraftShelf>>('draft shelves', {
  providedIn: 'root',
  factory: () => () => databaseShelf('layerwright'),
});

/** The browser's own database. Copying keeps what the entries of a history share, so depth costs only what was changed. */
export async function databaseShelf(name: string): Promise<DraftShelf & { close(): void }> {
  const database = await openDB<DraftDatabase>(name, 1, {
    upgrade: (db) => {
      db.createObjectStore('drafts', { keyPath: 'key' });
    },
  });
  return {
    get: (key) => database.get('drafts', key),
    list: () => database.getAll('drafts'),
    put: async (draft) => {
      const transaction = database.transaction('drafts', 'readwrite', { durability: 'strict' });
      await Promise.all([transaction.store.put(draft), transaction.done]);
    },
    remove: (key) => database.delete('drafts', key),
    close: () => database.close(),
  };
}

/** As long as the page stays open. */
export function memoryShelf(): DraftShelf {
  const drafts = new Map<string, Draft>();
  return {
    get: (key) => Promise.resolve(drafts.get(key)),
    list: () => Promise.resolve([...drafts.values()]),
    put: (draft) => Promise.resolve(void drafts.set(draft.key, draft)),
    remove: (key) => Promise.resolve(void drafts.delete(key)),
  };
}
