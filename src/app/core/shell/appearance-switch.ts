import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { type Appearance, AppearanceStore } from '../appearance/appearance-store';

const CHOICES: readonly { readonly appearance: Appearance; readonly words: string; readonly icon: string }[] =
  [
    { appearance: 'system', words: 'As the system', icon: 'system' },
    { appearance: 'light', words: 'Paper (light)', icon: 'light' },
    { appearance: 'dark', words: 'Soot (dark)', icon: 'dark' },
  ];

let instances = 0;

/** Light, dark, or what the reader's system says. */
@Component({
  selector: 'lw-appearance-switch',
  imports: [MatIcon],
  template: `
    <fieldset>
      <legend>Appearance</legend>
      @for (choice of choices; track choice.appearance) {
        <label>
          <input
            type="radio"
            [name]="group"
            [checked]="store.appearance() === choice.appearance"
            (change)="store.choose(choice.appearance)"
          />
          <mat-icon [svgIcon]="choice.icon" />
          {{ choice.words }}
        </label>
      }
    </fieldset>
  `,
  styleUrl: './appearance-switch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AppearanceSwitch {
  protected readonly store = inject(AppearanceStore);
  protected readonly choices = CHOICES;
  /** The switch may be on a page twice. */
  protected readonly group = `lw-appearance-${instances++}`;
}
