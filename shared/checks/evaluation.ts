import type { Design } from '../design/index.js';
import {
  type Forging,
  type State,
  type StepRefusal,
  type StockItem,
  type Totals,
  evaluate,
  figuresOf,
} from '../forging/index.js';
import { type CarbonAfter, carbonAfter } from '../metallurgy/index.js';
import { type Format, formatFor } from '../units/index.js';
import { type Warning, warningsOf } from './checks.js';
import { refusalWords } from './refusal-words.js';

/** Why a bar stops, in figures and words. */
export interface EvaluatedRefusal {
  readonly code: StepRefusal['code'];
  /** Null when the bar's pieces make no bar. */
  readonly stepId: string | null;
  /** Field of the step (or of the bar) that asks for too much. */
  readonly field: string;
  readonly asked: number;
  readonly available: number;
  readonly unit: StepRefusal['unit'];
  readonly message: string;
}

/** A bar after every step, up to the one that can't be done. */
export interface EvaluatedBar {
  readonly states: readonly State[];
  readonly refusal?: EvaluatedRefusal;
}

/** All that is worked out of a design, as plain JSON: the answer of `POST /api/evaluate`. */
export interface Evaluation {
  readonly bars: { readonly [barId: string]: EvaluatedBar };
  /** Null while a step on the way to the result is refused; so are `totals` and `carbon`. */
  readonly result: State | null;
  readonly totals: Totals | null;
  readonly carbon: CarbonAfter | null;
  readonly warnings: readonly Warning[];
  readonly stock: readonly StockItem[];
}

/** A forging as plain JSON. @param format units of the words in it; millimetres when absent */
export function evaluation(forging: Forging, format: Format = formatFor('mm')): Evaluation {
  return {
    bars: Object.fromEntries(
      forging.bars.map((bar) => {
        const states = bar.states.map(figuresOf);
        const refusal = bar.refusal && evaluatedRefusal(bar.refusal, forging.design, format);
        return [bar.id, refusal ? { states, refusal } : { states }];
      }),
    ),
    result: forging.result && figuresOf(forging.result),
    totals: forging.totals,
    carbon: carbonAfter(forging),
    warnings: warningsOf(forging, format),
    stock: forging.stock,
  };
}

/** What client and server do with a design: work it out, and say it in the reader's units. */
export function assess(
  design: Design,
  previous?: Forging,
  format: Format = formatFor('mm'),
): { readonly forging: Forging; readonly evaluation: Evaluation } {
  const forging = evaluate(design, previous);
  return { forging, evaluation: evaluation(forging, format) };
}

function evaluatedRefusal(refusal: StepRefusal, design: Design, format: Format): EvaluatedRefusal {
  const { code, step, field, asked, available, unit } = refusal;
  const message = refusalWords(refusal, design, format);
  return { code, stepId: step?.id ?? null, field, asked, available, unit, message };
}
