import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Hatch, type Steel, toneOf } from '@shared/steels';
import { swatchBackground } from './hatch-path';

/** A steel's etched tone and hatch. Says nothing to a screen reader: the steel's name stands beside it. */
@Component({
  selector: 'lw-steel-swatch',
  template: '',
  styleUrl: './steel-swatch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true', '[style.background]': 'background()' },
})
export class SteelSwatch {
  readonly steel = input.required<Steel>();
  /** The hatch among the steels shown together; the steel's own when absent. */
  readonly hatch = input<Hatch>();

  protected readonly background = computed(() => swatchBackground(toneOf(this.steel()), this.hatch()));
}
