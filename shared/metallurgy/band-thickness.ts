import { type Axis, type BarState, extentMm, isSolid } from '../bar/index.js';
import type { ForgedBar, ForgedState } from '../forging/index.js';
import type { Allowances, Step } from '../steps/index.js';

/** Kinds of step that make layers thinner or thicker without taking any away. */
const RESIZING_KINDS: ReadonlySet<Step['kind']> = new Set<Step['kind']>(['weld', 'draw', 'groove', 'dimple']);

/** Whether a step presses the layers themselves to another thickness. */
export function isResizing(step: Step): boolean {
  return RESIZING_KINDS.has(step.kind);
}

/**
 * How many times as thick a step makes the layers inside a bar: 1 for steps that only cut, stack or turn.
 * Layers that lie across an axis follow its extent; layers that lie every way (twisted, on the corners, joined at odds)
 * follow the square root of the cross-section, since a bar drawn out shrinks alike both ways. An assumption.
 */
export function thicknessRatio(before: BarState, after: ForgedState, allowances: Allowances): number {
  const { step, bar } = after;
  if (step === null || step.isOff || !isResizing(step)) return 1;
  const scaleMm = 2 * after.heats * allowances.scaleMmPerHeat;
  const ratio = (axis: Axis): number => extentMm(bar, axis) / (extentMm(before, axis) - scaleMm);
  return before.lie === 'mixed' ? Math.sqrt(ratio('width') * ratio('thickness')) : ratio(before.lie);
}

/** {@link thicknessRatio} from the start of a bar to each of its states; the start is 1. */
export function ratiosOf(bar: ForgedBar, allowances: Allowances): readonly number[] {
  const ratios: number[] = [];
  bar.states.forEach((state, i) => {
    const before = bar.states[i - 1];
    ratios.push(before ? (ratios[i - 1] as number) * thicknessRatio(before.bar, state, allowances) : 1);
  });
  return ratios;
}

/**
 * Mean thickness in mm of the bands of a stack in each state of its bar: half the period of two steels in turn.
 * Where a straight walk shows all layers it is counted; past a twist the last known one is carried along by
 * {@link thicknessRatio}.
 */
export function stackBandsMm(bar: ForgedBar, allowances: Allowances): readonly number[] {
  const bandsMm: number[] = [];
  bar.states.forEach((state, i) => {
    const { section } = state.bar;
    const before = bar.states[i - 1];
    if (section !== null && (before === undefined || !isSolid(state.bar))) {
      bandsMm.push(section.totalMm / section.bands);
    } else {
      bandsMm.push((bandsMm[i - 1] ?? 0) * (before ? thicknessRatio(before.bar, state, allowances) : 1));
    }
  });
  return bandsMm;
}
