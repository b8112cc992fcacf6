import type { BarState, Losses } from '../bar/index.js';
import type { Design, ShopLimits } from '../design/index.js';
import type { Steel } from '../steels/index.js';
import type { Allowances, Refusal, Step } from '../steps/index.js';
import type { Overhang } from './assembly.js';

/** A bar after one of its steps, with what that step cost. */
export interface ForgedState {
  /** Null for the start. */
  readonly step: Step | null;
  readonly bar: BarState;
  readonly lossesKg: Losses;
  readonly heats: number;
  readonly minutesAtHeat: number;
  /** Whole layers that went in this step, by cause. */
  readonly eatenLayers: { readonly scale: number; readonly grinding: number };
}

/** Why a bar stops: at a step, or at its start (`step` null) when its pieces don't make a bar. */
export interface StepRefusal extends Refusal {
  readonly bar: string;
  readonly step: Step | null;
}

/** A bar of the design with all that could be computed of it. */
export interface ForgedBar {
  readonly id: string;
  readonly states: readonly ForgedState[];
  readonly refusal: StepRefusal | null;
  /** What was trimmed of each piece of an assembly; empty for a stack. */
  readonly overhangs: readonly Overhang[];
  /** The pieces of an assembly as they were laid in, before trimming; empty for a stack. */
  readonly pieces: readonly BarState[];
  /** Into how many pieces later bars cut this one. */
  readonly cutInto: number;
  /** Whether it ends in the design's result. */
  readonly endsInResult: boolean;
}

export interface Totals {
  /** All stock that goes in. */
  readonly startMassKg: number;
  readonly endMassKg: number;
  readonly yieldPercent: number;
  readonly welds: number;
  readonly heats: number;
  readonly lossesKg: Losses;
}

/** Bars to be cut from stock: so many pieces of one size and steel. */
export interface StockItem {
  readonly steel: string;
  readonly thicknessMm: number;
  readonly widthMm: number;
  readonly lengthMm: number;
  readonly pieces: number;
}

/** A design with the state of every bar after every step. */
export interface Forging {
  readonly design: Design;
  readonly allowances: Allowances;
  readonly limits: ShopLimits;
  /** The steels laid, in the order that `Section.steels` counts in. */
  readonly steels: readonly Steel[];
  readonly bars: readonly ForgedBar[];
  /** The result bar's last state; null while a step on the way to it is refused. */
  readonly result: ForgedState | null;
  /** Null while there is no result. */
  readonly totals: Totals | null;
  readonly stock: readonly StockItem[];
  /** Steps worked out anew; the others were taken from the forging given as the previous one. */
  readonly stepsForged: number;
}
