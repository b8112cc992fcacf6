import { DestroyRef, Injectable, inject } from '@angular/core';
import type { Draft } from '../../core/drafts/draft';
import { DraftStore } from '../../core/drafts/draft-store';

/** Rest between two writes, ms: copying a long history takes a few of them. */
const PACE_MS = 250;

/**
 * Writes the newest draft into the browser, one write at a time: while one is under way, only the last of those that
 * came meanwhile waits. So a killed tab loses at most what was typed during one write.
 */
@Injectable()
export class DraftWriter {
  private readonly drafts = inject(DraftStore);
  private waiting: (() => Draft) | null = null;
  private writing: Promise<void> | null = null;
  private endRest: () => void = () => undefined;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.hurry());
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

  /** Writes what waits without another rest: the page may be closed any moment. */
  hurry(): void {
    this.endRest();
  }

  private rest(): Promise<void> {
    return new Promise((resolve) => {
      const timer = setTimeout(resolve, PACE_MS);
      this.endRest = () => {
        clearTimeout(timer);
        resolve();
      };
    });
  }

  private hasMore(): boolean {
    return this.waiting !== null;
  }

  private async run(): Promise<void> {
    while (this.waiting) {
      const draft = this.waiting();
      this.waiting = null;
      await this.drafts.put(draft);
      // What came meanwhile waits a little: a drag changes the design sixty times a second.
      if (this.hasMore()) await this.rest();
    }
    this.writing = null;
  }
}
