import { inject, Injectable, signal } from '@angular/core';
import type { Draft } from './draft';
import { DRAFT_SHELVES, type DraftShelf, memoryShelf } from './draft-shelf';

/** Where drafts are kept: not known yet, in the browser's database, or only as long as this page stays open. */
export type DraftKeeping = 'opening' | 'kept' | 'memory';

/**
 * Keeps drafts in the browser, through a reload and a killed tab.
 *
 * Each write is read back before it counts. Where the browser's database is closed to us, full or forgetful, drafts
 * stay in memory and `keeping` says so, for the page to warn.
 */
@Injectable({ providedIn: 'root' })
export class DraftStore {
  private readonly openShelf = inject(DRAFT_SHELVES);
  private readonly keptHow = signal<DraftKeeping>('opening');
  private readonly memory = memoryShelf();
  private opening: Promise<DraftShelf> | undefined;

  readonly keeping = this.keptHow.asReadonly();

  async get(key: string): Promise<Draft | undefined> {
    return (await this.memory.get(key)) ?? (await this.reading((shelf) => shelf.get(key), undefined));
  }

  /** All drafts, the last saved first. */
  async list(): Promise<readonly Draft[]> {
    const [inMemory, onDisk] = [await this.memory.list(), await this.reading((shelf) => shelf.list(), [])];
    const newer = new Set(inMemory.map(({ key }) => key));
    return [...inMemory, ...onDisk.filter(({ key }) => !newer.has(key))].sort((a, b) =>
      b.savedAt.localeCompare(a.savedAt),
    );
  }

  /**
   * Keeps a draft in the place of the one with its key.
   * @returns whether it survives a reload
   */
  async put(draft: Draft): Promise<boolean> {
    try {
      const shelf = await this.open();
      await shelf.put(draft);
      const back = await shelf.get(draft.key);
      if (back?.savedAt !== draft.savedAt) throw new Error('The browser does not keep what it was given');
      await this.memory.remove(draft.key);
      this.keptHow.set('kept');
      return true;
    } catch {
      await this.memory.put(draft);
      this.keptHow.set('memory');
      return false;
    }
  }

  async remove(key: string): Promise<void> {
    await this.memory.remove(key);
    await this.reading((shelf) => shelf.remove(key), undefined);
  }

  /** Takes away the copies of designs that the server has; unsaved work stays. */
  async removeSaved(): Promise<void> {
    for (const { key, isSaved } of await this.list()) {
      if (isSaved) await this.remove(key);
    }
  }

  private async reading<T>(read: (shelf: DraftShelf) => Promise<T>, otherwise: T): Promise<T> {
    try {
      const result = await read(await this.open());
      if (this.keptHow() === 'opening') this.keptHow.set('kept');
      return result;
    } catch {
      this.keptHow.set('memory');
      return otherwise;
    }
  }

  /** A failed opening is tried again at the next call. */
  private open(): Promise<DraftShelf> {
    this.opening ??= this.openShelf().catch((error: unknown) => {
      this.opening = undefined;
      throw error;
    });
    return this.opening;
  }
}
