import { DestroyRef, Injectable, inject } from '@angular/core';
import type { Draft } from '../../core/drafts/draft';
import { DraftStore } from '../../core/drafts/draft-store';

/**
 * Writes the newest draft into the browser, one write at a time: while one is under way, only the last of those that
 * came meanwhile waits. So a killed tab loses at most what was typed during one write.
 */
@Injectable()
export class DraftWriter {
  private readonly drafts = inject(DraftStore);
  private waiting: (() => Draft) | null = null;
  private writing: Promise<void> | null = null;

  constructor() {
    inject(DestroyRef).onDestroy(() => void this.idle());
  }

  /** @param draft asked for when its turn comes */
  write(draft: () => Draft): void {
    this.waiting = draft;
    this.writing ??= this.run();
  }

  /** Forgets what waits, and removes what is kept. */
  async remove(key: string): Promise<void> {
    this.waiting = null;
    await this.writing;
    await this.drafts.remove(key);
  }

  /** Resolves when everything asked for is written. */
  async idle(): Promise<void> {
    await this.writing;
  }

  private async run(): Promise<void> {
    while (this.waiting) {
      const draft = this.waiting();
      this.waiting = null;
      await this.drafts.put(draft);
    }
    this.writing = null;
  }
}
