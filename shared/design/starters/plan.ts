import type { Step } from '../../steps/index.js';
import { repeatedGroup } from '../edits/index.js';
import { type Bar, DESIGN_FORMAT, DESIGN_VERSION, type Design, type Layer, type Piece } from '../schema.js';

/** A ready design to start from. */
export interface Starter {
  readonly id: string;
  readonly title: string;
  /** What the pattern looks like and what it takes, in one sentence. */
  readonly sentence: string;
  readonly design: Design;
}

type WithoutId<S> = S extends Step ? Omit<S, 'id'> : never;
export type StepPlan = WithoutId<Step>;

/** Two steels in turn, ending on the first, so that both faces are of it. */
export function pair(first: Layer, second: Layer, times: number): readonly Layer[] {
  return repeatedGroup([first, second], times, true);
}

export const steel = (id: string, thicknessMm: number): Layer => ({ steel: id, thicknessMm });

/** A bar that starts as a stack. Step ids are the bar's id and the step's number. */
export function stackBar(
  id: string,
  name: string,
  size: { lengthMm: number; widthMm: number; layers: readonly Layer[] },
  plans: readonly StepPlan[],
): Bar {
  return { id, name, start: { kind: 'stack', ...size }, steps: numbered(id, plans) };
}

/** A bar that starts as an assembly of earlier bars. */
export function assembledBar(
  id: string,
  name: string,
  along: 'thickness' | 'width',
  pieces: readonly Piece[],
  plans: readonly StepPlan[],
): Bar {
  return { id, name, start: { kind: 'assembly', along, pieces }, steps: numbered(id, plans) };
}

/** A design whose last bar is the result. */
export function designOf(name: string, note: string, bars: readonly Bar[], blank: Design['blank']): Design {
  const result = (bars[bars.length - 1] as Bar).id;
  return {
    format: DESIGN_FORMAT,
    version: DESIGN_VERSION,
    name,
    note,
    bars,
    result,
    ...(blank && { blank }),
  };
}

function numbered(barId: string, plans: readonly StepPlan[]): readonly Step[] {
  return plans.map((plan, i) => ({ id: `${barId}-${i + 1}`, ...plan }));
}
