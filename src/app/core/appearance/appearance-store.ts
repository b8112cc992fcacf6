import { DOCUMENT, effect, inject, Injectable, signal } from '@angular/core';
import { Settings } from '../settings/settings';

export const APPEARANCES = ['system', 'light', 'dark'] as const;
export type Appearance = (typeof APPEARANCES)[number];

/** Paper, soot, or whatever the reader's system says. */
@Injectable({ providedIn: 'root' })
export class AppearanceStore {
  private readonly settings = inject(Settings);
  private readonly document = inject(DOCUMENT);
  private readonly chosen = signal<Appearance>(this.settings.read('appearance', APPEARANCES) ?? 'system');

  readonly appearance = this.chosen.asReadonly();

  constructor() {
    effect(() => {
      const appearance = this.chosen();
      const { dataset } = this.document.documentElement;
      if (appearance === 'system') delete dataset['appearance'];
      else dataset['appearance'] = appearance;
    });
  }

  choose(appearance: Appearance): void {
    this.chosen.set(appearance);
    this.settings.write('appearance', appearance);
  }
}
