import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { layerThicknessMm, massKg, volumeMm3 } from '@shared/bar';
import type { ForgedBar, ForgedState, Forging } from '@shared/forging';
import { kindOf } from '@shared/steps';
import { toneOf } from '@shared/steels';
import { UnitsStore } from '../core/units/units-store';

/** Past this many, lines on a screen run into each other. */
const MOST_LAYERS_DRAWN = 80;

/** A bar's way through its steps: each state from the side, all to one scale, with its figures. */
@Component({
  selector: 'lw-journey-drawing',
  templateUrl: './journey-drawing.html',
  styleUrl: './journey-drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JourneyDrawing {
  private readonly units = inject(UnitsStore);
  readonly forging = input.required<Forging>();

  private readonly bar = computed(() => {
    const { bars, design } = this.forging();
    return bars.find(({ id }) => id === design.result) as ForgedBar;
  });
  private readonly longestMm = computed(() => Math.max(...this.bar().states.map(({ bar }) => bar.lengthMm)));

  protected readonly rows = computed(() => {
    const format = this.units.format();
    return this.bar().states.map((state, place) => {
      const { bar, step, heats } = state;
      return {
        place,
        title: step ? kindOf(step).words.name : 'Stack',
        heats: heats === 0 ? '' : heats === 1 ? '1 heat' : `${format.count(heats)} heats`,
        length: format.roughLength(bar.lengthMm),
        thickness: format.roughLength(bar.thicknessMm),
        layers: format.count(bar.layers),
        mass: format.mass(massKg(volumeMm3(bar), bar.densityKgM3)),
        viewBox: `0 0 ${bar.lengthMm} ${bar.thicknessMm}`,
        lengthMm: bar.lengthMm,
        thicknessMm: bar.thicknessMm,
        widthPercent: (bar.lengthMm / this.longestMm()) * 100,
        layersDrawn: this.layersOf(state),
      };
    });
  });

  /** Top first; empty where the layers don't show from the side. */
  private layersOf({ bar }: ForgedState): readonly { y: number; height: number; fill: string }[] {
    const { section, lie, thicknessMm } = bar;
    if (section === null || lie !== 'thickness' || section.steels.length > MOST_LAYERS_DRAWN) return [];
    let top = thicknessMm;
    return Array.from(section.steels, (steel, i) => {
      const height = layerThicknessMm(section, i);
      top -= height;
      const material = this.forging().steels[steel];
      return { y: top, height, fill: material ? toneOf(material).hex : 'none' };
    });
  }
}
