import { type Evaluation, assess } from '../../shared/checks/index.js';
import type { Design } from '../../shared/design/index.js';
import { type Forging, evaluate } from '../../shared/forging/index.js';
import type { SheetOrder } from '../cards/print.js';

/** Why a design has no result: the step (or the start of a bar) that cannot be done. */
export interface RefusedStep {
  readonly bar: string;
  /** Null when the pieces of the bar make no bar. */
  readonly stepId: string | null;
  readonly field: string;
  readonly asked: number;
  readonly available: number;
  readonly unit: string;
  readonly code: string;
  readonly message: string;
}

/** What a list says about a design without opening it. */
export interface DesignFigures {
  /** Null while a step on the way to the result cannot be done, as are the masses. */
  readonly layers: number | null;
  readonly bars: number;
  readonly startMassKg: number | null;
  readonly endMassKg: number | null;
}

export type EvaluationAnswer = { readonly evaluation: Evaluation } | { readonly refused: RefusedStep };

/** The work that is done off the main thread: plain data in, plain data out. */
export const TASKS = {
  evaluation: (design: Design): EvaluationAnswer => {
    const { forging, evaluation } = assess(design);
    if (evaluation.result !== null) return { evaluation };
    return { refused: refusedOf(forging, evaluation) };
  },

  summary: (design: Design): DesignFigures => {
    const { result, totals } = evaluate(design);
    return {
      layers: result?.bar.layers ?? null,
      bars: design.bars.length,
      startMassKg: totals?.startMassKg ?? null,
      endMassKg: totals?.endMassKg ?? null,
    };
  },

  // What prints takes longer to load than everything else together, and is seldom asked for.
  forgeCard: async (order: SheetOrder): Promise<Uint8Array> =>
    (await import('../cards/print.js')).printForgeCard(order),

  cutSheet: async (order: SheetOrder): Promise<Uint8Array> =>
    (await import('../cards/print.js')).printCutSheet(order),
} as const;

export type TaskName = keyof typeof TASKS;
export type TaskInput<N extends TaskName> = Parameters<(typeof TASKS)[N]>[0];
export type TaskOutput<N extends TaskName> = Awaited<ReturnType<(typeof TASKS)[N]>>;

/** Where tasks are done. */
export interface Compute {
  /** Throws a {@link TooMuchWorkError} when it takes too long. */
  run<N extends TaskName>(name: N, input: TaskInput<N>): Promise<TaskOutput<N>>;
}

/** What was asked for takes longer than one request may. */
export class TooMuchWorkError extends Error {
  override readonly name = 'TooMuchWorkError';
}

/** The first refusal on the way to the result. */
function refusedOf(forging: Forging, evaluation: Evaluation): RefusedStep {
  const bar = forging.bars.find(({ refusal, endsInResult }) => refusal && endsInResult);
  const refusal = bar && evaluation.bars[bar.id]?.refusal;
  if (!bar || !refusal) throw new Error('A design without a result has no step that was refused.');
  return { bar: bar.id, ...refusal };
}
