import { type Lie, type Losses, layerCount, massKg, volumeMm3 } from '../bar/index.js';
import type { ForgedState } from './forging.js';

/** The state of a bar in figures, as the API gives it and screens show it. */
export interface State {
  /** Null for the start. */
  readonly stepId: string | null;
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
  readonly volumeMm3: number;
  readonly massKg: number;
  /** Layers laid, counted through. */
  readonly layers: number;
  /** Bands that can be told apart; null where no straight walk through the section shows them all. */
  readonly bands: number | null;
  readonly lie: Lie;
  /** Of the layers that are left; null where `bands` is. */
  readonly layerThicknessMm: { readonly min: number; readonly mean: number; readonly max: number } | null;
  /** Of this step. */
  readonly heats: number;
  readonly minutesAtHeat: number;
  readonly lossesKg: Losses;
}

/** The figures of a forged state. */
export function figuresOf(state: ForgedState): State {
  const { bar } = state;
  const { section } = bar;
  const volume = volumeMm3(bar);
  return {
    stepId: state.step?.id ?? null,
    lengthMm: bar.lengthMm,
    widthMm: bar.widthMm,
    thicknessMm: bar.thicknessMm,
    volumeMm3: volume,
    massKg: massKg(volume, bar.densityKgM3),
    layers: bar.layers,
    bands: section && section.bands,
    lie: bar.lie,
    layerThicknessMm: section && {
      min: section.minMm,
      mean: section.totalMm / layerCount(section),
      max: section.maxMm,
    },
    heats: state.heats,
    minutesAtHeat: state.minutesAtHeat,
    lossesKg: state.lossesKg,
  };
}
