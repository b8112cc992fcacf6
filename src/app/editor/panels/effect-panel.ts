import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { LOSS_CAUSES, type LossCause, totalLoss } from '@shared/bar';
import { type State, figuresOf } from '@shared/forging';
import type { Format, QuantityParts } from '@shared/units';
import { UnitsStore } from '../../core/units/units-store';
import { Figure } from '../../ui/figure/figure';
import { DesignStore } from '../design-store';

/** A figure of the selected state, with what it was before the step. */
interface Effect {
  readonly label: string;
  readonly to: QuantityParts;
  readonly from: QuantityParts | undefined;
}

const CAUSE_WORDS: Readonly<Record<LossCause, string>> = {
  scale: 'scale',
  kerf: 'saw kerf',
  grinding: 'grinding',
  cutting: 'cutting',
  trim: 'trim',
};

/** What the selected step makes of the bar, in figures: from … to …, and what it costs. */
@Component({
  selector: 'lw-effect-panel',
  imports: [Figure],
  templateUrl: './effect-panel.html',
  styleUrl: './effect-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EffectPanel {
  private readonly store = inject(DesignStore);
  private readonly units = inject(UnitsStore);

  private readonly states = computed(() => {
    const { forged, place } = this.store.selected();
    const after = forged.states[place];
    const before = place > 0 ? forged.states[place - 1] : undefined;
    return after && { after: figuresOf(after), before: before && figuresOf(before) };
  });

  protected readonly effects = computed((): readonly Effect[] | null => {
    const states = this.states();
    if (!states) return null;
    const format = this.units.format();
    return FIGURES.flatMap(({ label, of }) => {
      const to = of(states.after, format);
      return to ? [{ label, to, from: states.before && (of(states.before, format) ?? undefined) }] : [];
    });
  });

  protected readonly cost = computed((): string => {
    const states = this.states();
    if (!states) return '';
    const { heats, minutesAtHeat, lossesKg } = states.after;
    const format = this.units.format();
    const words: string[] = [];
    if (heats > 0) {
      words.push(
        `${format.count(heats)} ${heats === 1 ? 'heat' : 'heats'}, ${format.duration(minutesAtHeat)} at temperature`,
      );
    }
    const lost = LOSS_CAUSES.filter((cause) => lossesKg[cause] > 0).map(
      (cause) => `${format.mass(lossesKg[cause])} ${CAUSE_WORDS[cause]}`,
    );
    if (totalLoss(lossesKg) > 0) words.push(`lost: ${lost.join(', ')}`);
    const text = words.join('; ');
    return text && text.charAt(0).toUpperCase() + text.slice(1) + '.';
  });
}

const FIGURES: readonly {
  readonly label: string;
  readonly of: (state: State, format: Format) => QuantityParts | null;
}[] = [
  { label: 'Length', of: (state, format) => format.lengthParts(state.lengthMm) },
  { label: 'Width', of: (state, format) => format.lengthParts(state.widthMm) },
  { label: 'Thickness', of: (state, format) => format.lengthParts(state.thicknessMm) },
  { label: 'Mass', of: (state, format) => format.massParts(state.massKg) },
  { label: 'Layers', of: (state, format) => ({ number: format.count(state.layers), unit: '' }) },
  {
    label: 'Bands seen',
    of: (state, format) => (state.bands === null ? null : { number: format.count(state.bands), unit: '' }),
  },
  {
    label: 'Thinnest layer',
    of: (state, format) => state.layerThicknessMm && format.lengthParts(state.layerThicknessMm.min),
  },
  {
    label: 'Thickest layer',
    of: (state, format) => state.layerThicknessMm && format.lengthParts(state.layerThicknessMm.max),
  },
];
