import type * as z from 'zod';
import {
  type BarState,
  type CutShort,
  type Losses,
  NO_LOSSES,
  type TraceOp,
  cutBar,
  fromEveryFace,
  isCutShort,
} from '../bar/index.js';
import type { Format } from '../units/index.js';
import type { Fields, StepBase } from './field.js';

/** The planning figures a step is computed with; each has a default with its source, see `allowances.ts`. */
export interface Allowances {
  /** Metal lost to scale on each face in each heat, mm. */
  readonly scaleMmPerHeat: number;
  /** Width of a saw cut, mm. */
  readonly kerfMm: number;
  /** Ground off each face that is put together, mm. */
  readonly seamGrindMm: number;
  /** Temperature of a heat that doesn't weld, °C. */
  readonly forgeTemperatureC: number;
  /** Temperature of a welding heat, °C. */
  readonly weldTemperatureC: number;
  /** Minutes at temperature in each heat. */
  readonly minutesPerHeat: number;
}

/** Why a step can't be done: which field asks for how much, and how much there is. */
export interface Refusal {
  readonly code: RefusalCode;
  /** The field of the step (or of the bar) that asks for too much. */
  readonly field: string;
  readonly asked: number;
  readonly available: number;
  readonly unit: 'mm' | 'layers' | 'pieces';
}

export type RefusalCode =
  | 'nothing-left'
  | 'too-short'
  | 'cut-too-deep'
  | 'size-impossible'
  | 'too-many-layers'
  | 'unknown-steel'
  | 'piece-refused';

/** What a step makes of a bar. Losses are volumes, mm³. */
export interface Forged {
  readonly bar: BarState;
  readonly lossesMm3: Losses;
  /** Whole layers that went, by cause. */
  readonly eatenLayers: { readonly scale: number; readonly grinding: number };
}

export type ForgeResult = Forged | { readonly refusal: Refusal };

/** Everything the program knows of a kind of step; the table in `table.ts` lists them all. */
export interface StepKind<S extends StepBase & { readonly kind: string }> {
  readonly kind: S['kind'];
  readonly fields: Fields;
  readonly schema: z.ZodType<S>;
  /** Heats an ordinary step of this kind takes; the form's proposal. Common practice, no source. */
  readonly usualHeats: number;
  /** A step of this kind that makes sense for `bar`, without its id. */
  readonly propose: (bar: BarState) => Omit<S, 'id'>;
  /** The bar after the step; `bar` has already lost the scale of the step's heats. */
  readonly forge: (bar: BarState, step: S, allowances: Allowances) => ForgeResult;
  /** The way back of a point, in the order in which ops are applied; `earlier` has already lost the scale of the heats. */
  readonly trace: (step: S, earlier: BarState, later: BarState, allowances: Allowances) => readonly TraceOp[];
  readonly words: StepWords<S>;
}

/** How a kind of step is spoken of. */
export interface StepWords<S> {
  /** "Draw out" */
  readonly name: string;
  /** One sentence: what it is for. */
  readonly purpose: string;
  /** What to do, in the reader's units, for a list or a card: "Draw to 300 mm × 40 mm". */
  readonly instruction: (step: S, format: Format) => string;
}

/** A step that only changes the bar's form. */
export function forgedTo(bar: BarState): Forged {
  return { bar, lossesMm3: NO_LOSSES, eatenLayers: { scale: 0, grinding: 0 } };
}

/** A refusal, ready to be returned. */
export function refuse(
  code: RefusalCode,
  field: string,
  asked: number,
  available: number,
  unit: Refusal['unit'] = 'mm',
): { readonly refusal: Refusal } {
  return { refusal: { code, field, asked, available, unit } };
}

/** A refusal for a cut that leaves nothing, naming the field that asked for it. */
export function refuseCut(short: CutShort, field: string): { readonly refusal: Refusal } {
  return refuse('nothing-left', field, short.askedMm, short.availableMm);
}

export function isRefused(result: ForgeResult): result is { readonly refusal: Refusal } {
  return 'refusal' in result;
}

/** Takes the scale of the step's heats off all six faces. */
export function scaled(bar: BarState, step: StepBase, allowances: Allowances): ForgeResult {
  const scaleMm = (step.heats ?? 0) * allowances.scaleMmPerHeat;
  if (scaleMm === 0) return forgedTo(bar);
  const cut = cutBar(bar, fromEveryFace(scaleMm));
  if (isCutShort(cut)) return refuseCut(cut, 'heats');
  return {
    bar: cut.bar,
    lossesMm3: { ...NO_LOSSES, scale: cut.removedMm3 },
    eatenLayers: { scale: cut.eatenLayers, grinding: 0 },
  };
}
