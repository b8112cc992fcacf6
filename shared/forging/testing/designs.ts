import type { Bar, Design, Layer, Stack } from '../../design/index.js';
import type { Step } from '../../steps/index.js';

/** A step without its id, of any kind. */
type Unnamed<S> = S extends Step ? Omit<S, 'id'> : never;
export type StepPlan = Unnamed<Step>;

/** Steps with ids that tell the bar and the place. */
export function stepsOf(barId: string, plans: readonly StepPlan[]): readonly Step[] {
  return plans.map((plan, i) => ({ ...plan, id: `${barId}-${i + 1}` }));
}

/** `count` layers of two steels in turn, from the bottom, starting with the first. */
export function alternating(
  count: number,
  steels: readonly [string, string] = ['1084', '15n20'],
  thicknessMm: readonly [number, number] = [3, 2],
): readonly Layer[] {
  return Array.from({ length: count }, (_, i) => ({
    steel: steels[i % 2] as string,
    thicknessMm: thicknessMm[i % 2] as number,
  }));
}

export function stackOf(layers: readonly Layer[], lengthMm = 150, widthMm = 40): Stack {
  return { kind: 'stack', lengthMm, widthMm, layers };
}

export function barFrom(id: string, start: Bar['start'], plans: readonly StepPlan[] = []): Bar {
  return { id, name: id, start, steps: stepsOf(id, plans) };
}

/** A design of the given bars; the last is the result. */
export function designOf(bars: readonly Bar[], rest: Partial<Design> = {}): Design {
  return {
    format: 'layerwright.design',
    version: 1,
    name: 'Test',
    bars,
    result: (bars[bars.length - 1] as Bar).id,
    ...rest,
  };
}

/** A one-bar design. */
export function billet(
  layers: readonly Layer[],
  plans: readonly StepPlan[],
  rest: Partial<Design> = {},
): Design {
  return designOf([barFrom('billet', stackOf(layers), plans)], rest);
}

/** Allowances under which nothing is lost by itself. */
export const LOSSLESS = { scaleMmPerHeat: 0, kerfMm: 0, seamGrindMm: 0 } as const;
