import { inject, Injectable, InjectionToken } from '@angular/core';

/** The browser's small storage; null where it is switched off. */
export const LOCAL_STORAGE = new InjectionToken<Storage | null>('local storage', {
  providedIn: 'root',
  factory: () => {
    try {
      return window.localStorage;
    } catch {
      return null;
    }
  },
});

/** Keeps the reader's settings from visit to visit; without storage they last as long as the page. */
@Injectable({ providedIn: 'root' })
export class Settings {
  private readonly storage = inject(LOCAL_STORAGE);

  /** The stored value if it is one of those allowed, else undefined. */
  read<T extends string>(name: string, allowed: readonly T[]): T | undefined {
    try {
      const value = this.storage?.getItem(keyOf(name));
      return allowed.find((one) => one === value);
    } catch {
      return undefined;
    }
  }

  write(name: string, value: string): void {
    try {
      this.storage?.setItem(keyOf(name), value);
    } catch {
      // Full or forbidden: a setting is not worth a message.
    }
  }
}

function keyOf(name: string): string {
  return `layerwright.${name}`;
}
