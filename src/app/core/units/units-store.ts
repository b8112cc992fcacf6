import { computed, inject, Injectable, signal } from '@angular/core';
import { formatFor, UNIT_SYSTEMS, type UnitSystem } from '@shared/units';
import { READER_LOCALE } from '../settings/reader-locale';
import { Settings } from '../settings/settings';

/** What the reader measures with; every figure on the screen goes through `format`. */
@Injectable({ providedIn: 'root' })
export class UnitsStore {
  private readonly settings = inject(Settings);
  private readonly chosen = signal<UnitSystem>(
    this.settings.read('units', UNIT_SYSTEMS) ?? usualIn(inject(READER_LOCALE)),
  );

  readonly system = this.chosen.asReadonly();
  readonly format = computed(() => formatFor(this.chosen()));

  choose(system: UnitSystem): void {
    this.chosen.set(system);
    this.settings.write('units', system);
  }
}

/** Shops of the United States work in inches; everyone else is offered millimetres first. */
function usualIn(locale: string): UnitSystem {
  return /-US\b/.test(locale) ? 'inch' : 'mm';
}
