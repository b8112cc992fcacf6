import { type BarState, type TraceOp, fromEveryFace, isIdentity, removalBack } from '../bar/index.js';
import { type Allowances, isRefused, scaled } from './step-kind.js';
import { type Step, kindOf } from './table.js';

/**
 * How a point of the bar after `step` is taken back to the bar before it: first through what the step does, then
 * through the scale that its heats took off. A step switched off has no ops.
 * @param earlier the bar before the step, before the scale of its heats
 * @param later the bar that `forgeStep` gave for the two
 * @throws RangeError when the step can't be done on `earlier`
 */
export function traceStep(
  step: Step,
  earlier: BarState,
  later: BarState,
  allowances: Allowances,
): readonly TraceOp[] {
  if (step.isOff) return [];
  const afterScale = scaled(earlier, step, allowances);
  if (isRefused(afterScale)) throw new RangeError(`traceStep: step "${step.id}" leaves nothing of the bar`);
  const scaleMm = (step.heats ?? 0) * allowances.scaleMmPerHeat;
  const ops = [
    ...kindOf(step).trace(step, afterScale.bar, later, allowances),
    removalBack(fromEveryFace(scaleMm)),
  ];
  return ops.filter((op) => op.op !== 'affine' || !isIdentity(op));
}
