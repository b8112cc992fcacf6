import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Starter } from '@shared/design';
import { UnitsStore } from '../core/units/units-store';
import { StackEnds } from './stack-ends';
import { forgedStarters, stepsOf } from './starter-figures';

/** The ready designs, each with its stacks to scale, a sentence and what comes of it. */
@Component({
  selector: 'lw-starter-gallery',
  imports: [MatButton, StackEnds],
  templateUrl: './starter-gallery.html',
  styleUrl: './starter-gallery.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StarterGallery {
  private readonly units = inject(UnitsStore);
  /** While one is being made, none can be chosen. */
  readonly isBusy = input(false);
  readonly chosen = output<Starter>();

  protected readonly cards = computed(() => {
    const format = this.units.format();
    return forgedStarters().map(({ starter, forging }) => ({
      starter,
      forging,
      steps: stepsOf(forging),
      figures: [
        { name: 'Layers', value: format.count(forging.result?.bar.layers ?? 0) },
        { name: 'Welds', value: format.count(forging.totals?.welds ?? 0) },
        { name: 'Heats', value: format.count(forging.totals?.heats ?? 0) },
        { name: 'In', value: format.mass(forging.totals?.startMassKg ?? NaN) },
        { name: 'Out', value: format.mass(forging.totals?.endMassKg ?? NaN) },
      ],
    }));
  });
}
