import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { BarState } from '@shared/bar';
import type { Steel } from '@shared/steels';
import { sketchOf } from './sketch-bands';

/** A bar from its left side, to a scale that the page sets for all of them. Its figures stand beside it in words. */
@Component({
  selector: 'lw-bar-sketch',
  templateUrl: './bar-sketch.html',
  styleUrl: './bar-sketch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BarSketch {
  readonly bar = input.required<BarState>();
  /** In the order that the bar's section counts in. */
  readonly steels = input.required<readonly Steel[]>();
  readonly pxPerMm = input.required<number>();

  protected readonly sketch = computed(() => sketchOf(this.bar(), this.steels(), this.pxPerMm()));
}
