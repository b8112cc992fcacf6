import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import type { UnitSystem } from '@shared/units';
import { UnitsStore } from '../units/units-store';

const CHOICES: readonly { readonly system: UnitSystem; readonly short: string; readonly words: string }[] = [
  { system: 'mm', short: 'mm', words: 'Millimetres, kilograms, °C' },
  { system: 'inch', short: 'in', words: 'Inches, pounds, °F' },
];

let instances = 0;

/** Millimetres or inches, for every figure on the screen at once. */
@Component({
  selector: 'lw-unit-switch',
  template: `
    <fieldset>
      <legend class="lw-unseen">Units</legend>
      @for (choice of choices; track choice.system) {
        <label [title]="choice.words">
          <input
            type="radio"
            [name]="group"
            [checked]="units.system() === choice.system"
            (change)="units.choose(choice.system)"
          />
          <span aria-hidden="true">{{ choice.short }}</span>
          <span class="lw-unseen">{{ choice.words }}</span>
        </label>
      }
    </fieldset>
  `,
  styleUrl: './unit-switch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitSwitch {
  protected readonly units = inject(UnitsStore);
  protected readonly choices = CHOICES;
  /** The switch may be on a page twice. */
  protected readonly group = `lw-units-${instances++}`;
}
