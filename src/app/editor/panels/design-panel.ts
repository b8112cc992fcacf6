import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { type Blank, LIMIT_DEFAULTS, type ShopLimits, setBlank } from '@shared/design';
import { ALLOWANCE_DEFAULTS, type Allowances } from '@shared/steps';
import { celsiusOf, fahrenheitOf } from '@shared/units';
import { UnitsStore } from '../../core/units/units-store';
import { LengthField } from '../../ui/length-field/length-field';
import { NumberField } from '../../ui/number-field/number-field';
import { DesignStore } from '../design-store';
import { setAllowance, setLimit, setNote } from '../document-edits';
import { TextField } from './text-field';

const ALLOWANCE_NAMES = Object.keys(ALLOWANCE_DEFAULTS) as readonly (keyof Allowances)[];
const LIMIT_NAMES = Object.keys(LIMIT_DEFAULTS) as readonly (keyof ShopLimits)[];

/** What belongs to the whole design: the blank it is for, the planning figures, what the shop's machines take, a note. */
@Component({
  selector: 'lw-design-panel',
  imports: [LengthField, MatButtonModule, NumberField, TextField],
  templateUrl: './design-panel.html',
  styleUrls: ['./panel.scss', './design-panel.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(focusout)': 'store.closeRun()' },
})
export class DesignPanel {
  protected readonly store = inject(DesignStore);
  protected readonly units = inject(UnitsStore);

  protected readonly allowances = computed(() =>
    ALLOWANCE_NAMES.map((name) => ({
      name,
      ...ALLOWANCE_DEFAULTS[name],
      default: ALLOWANCE_DEFAULTS[name].value,
      own: this.store.design().allowances?.[name],
    })),
  );
  protected readonly limits = computed(() =>
    LIMIT_NAMES.map((name) => ({
      name,
      ...LIMIT_DEFAULTS[name],
      label: LIMIT_DEFAULTS[name].label.split(',')[0] ?? name,
      default: LIMIT_DEFAULTS[name].value,
      own: this.store.design().limits?.[name],
      isLength: name.endsWith('Mm'),
    })),
  );

  protected readonly isMetric = computed(() => this.units.system() === 'mm');

  /** What fits into the billet as it ends, with a little to be ground off. */
  protected addBlank(): void {
    const end = this.store.forging().result?.bar;
    const rounded = (mm: number): number => Math.max(1, Math.round(mm * 0.9));
    const blank: Blank = {
      lengthMm: rounded(end?.lengthMm ?? 250),
      widthMm: rounded(end?.widthMm ?? 40),
      thicknessMm: rounded(end?.thicknessMm ?? 5),
    };
    this.store.edit((design) => setBlank(design, blank));
  }

  protected removeBlank(): void {
    this.store.edit((design) => setBlank(design, undefined));
  }

  protected setBlankSide(side: keyof Blank, mm: number | undefined): void {
    if (mm === undefined) return;
    this.store.edit(
      (design) => (design.blank ? setBlank(design, { ...design.blank, [side]: mm }) : design),
      `blank.${side}`,
    );
  }

  protected setAllowance(name: keyof Allowances, value: number | undefined): void {
    this.store.edit((design) => setAllowance(design, name, value), `allowances.${name}`);
  }

  protected setTemperature(name: keyof Allowances, shown: number | undefined): void {
    const isSame = shown === undefined || this.isMetric();
    this.setAllowance(name, isSame ? shown : Math.round(celsiusOf(shown) * 10) / 10);
  }

  protected setLimit(name: keyof ShopLimits, value: number | undefined): void {
    this.store.edit((design) => setLimit(design, name, value), `limits.${name}`);
  }

  protected setShare(name: keyof ShopLimits, percent: number | undefined): void {
    this.setLimit(name, percent === undefined ? undefined : Math.round(percent * 100) / 10_000);
  }

  protected setNote(note: string): void {
    this.store.edit((design) => setNote(design, note), 'note');
  }

  /** A temperature in the reader's degrees. */
  protected degrees<T extends number | undefined>(temperatureC: T): T {
    return temperatureC === undefined || this.isMetric()
      ? temperatureC
      : (Math.round(fahrenheitOf(temperatureC)) as T);
  }

  protected percent<T extends number | undefined>(share: T): T {
    return share === undefined ? share : ((share * 100) as T);
  }
}
