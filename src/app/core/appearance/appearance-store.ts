import { DOCUMENT, effect, inject, Injectable, signal } from '@angular/core';
import { Settings } from '../settings/settings';

export const APPEARANCES = ['system', 'light', 'dark'] as const;
export type Appearance = (typeof APPEARANCES)[number];

/** Paper, soot, or whatever the reader's system says. */
@Injectable({ providedIn: 'root' })
export class AppearanceStore {
  private readonly settings = inject(Settings);
  private readonly root = inject(DOCUMENT).documentElement;
  private readonly chosen = signal<Appearance>(this.settings.read('appearance', APPEARANCES) ?? 'system');

  readonly appearance = this.chosen.asReadonly();

  constructor() {
    effect(() => {
      const appearance = this.chosen();
      if (appearance === 'system') delete this.root.dataset['appearance'];
      else this.root.dataset['appearance'] = appearance;
    });
  }

  choose(appearance: Appearance): void {
    this.chosen.set(appearance);
    this.settings.write('appearance', appearance);
  }
}
