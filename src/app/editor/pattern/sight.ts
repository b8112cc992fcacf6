import { Injectable, InjectionToken, computed, inject, signal } from '@angular/core';
import { type Look, USUAL_LOOK } from '@shared/pattern';
import { type Choice, FIRST_CHOICE, VIEW_IDS } from './views';

/** How a bar is shown. */
export const MODES = ['surface', 'solid', 'drawing'] as const;
export type Mode = (typeof MODES)[number];

/** What the reader chose to see, and how. */
export interface Remembered {
  readonly mode: Mode;
  readonly choice: Choice;
  readonly look: Look;
  readonly isGrey: boolean;
}

export const FIRST_SIGHT: Remembered = {
  mode: 'surface',
  choice: FIRST_CHOICE,
  look: USUAL_LOOK,
  isGrey: false,
};

/** The browser's storage for one session; null where it is switched off. */
export const SESSION_STORAGE = new InjectionToken<Storage | null>('session storage', {
  providedIn: 'root',
  factory: () => {
    try {
      return window.sessionStorage;
    } catch {
      return null;
    }
  },
});

const KEY = 'layerwright.surface';

/** What the reader chose to see; kept for as long as the browser's session lasts. */
@Injectable({ providedIn: 'root' })
export class Sight {
  private readonly storage = inject(SESSION_STORAGE);
  private readonly now = signal(this.read());

  readonly mode = computed(() => this.now().mode);
  readonly choice = computed(() => this.now().choice);
  readonly look = computed(() => this.now().look);
  readonly isGrey = computed(() => this.now().isGrey);

  set(change: Partial<Remembered>): void {
    this.now.update((before) => ({ ...before, ...change }));
    try {
      this.storage?.setItem(KEY, JSON.stringify(this.now()));
    } catch {
      // Full or forbidden: a view is not worth a message.
    }
  }

  private read(): Remembered {
    try {
      return remembered(JSON.parse(this.storage?.getItem(KEY) ?? '{}'));
    } catch {
      return FIRST_SIGHT;
    }
  }
}

/** What of stored text makes sense; the rest is as at first sight. */
export function remembered(stored: unknown): Remembered {
  const { mode, choice, look, isGrey } = record(stored);
  const { view, depthMm, cutShare } = record(choice);
  const { etch, relief, grit } = record(look);
  return {
    mode: MODES.find((one) => one === mode) ?? FIRST_SIGHT.mode,
    choice: {
      view: VIEW_IDS.find((one) => one === view) ?? FIRST_CHOICE.view,
      depthMm: typeof depthMm === 'number' && depthMm >= 0 ? depthMm : null,
      cutShare: share(cutShare, FIRST_CHOICE.cutShare),
    },
    look: {
      etch: share(etch, USUAL_LOOK.etch),
      relief: share(relief, USUAL_LOOK.relief),
      grit: share(grit, USUAL_LOOK.grit),
    },
    isGrey: isGrey === true,
  };
}

function record(value: unknown): Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : {};
}

function share(value: unknown, otherwise: number): number {
  return typeof value === 'number' && value >= 0 && value <= 1 ? value : otherwise;
}
