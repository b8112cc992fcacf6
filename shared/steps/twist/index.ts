import { type BarState, isSolid } from '../../bar/index.js';
import { stepSchema } from '../field.js';
import { type StepKind, forgedTo } from '../step-kind.js';
import { type Twist, twistFields } from './fields.js';
import { traceTwist } from './trace.js';

export type { Twist } from './fields.js';

export const twist: StepKind<Twist> = {
  kind: 'twist',
  fields: twistFields,
  schema: stepSchema('twist', twistFields),
  usualHeats: 3,
  propose: (bar) => ({ kind: 'twist', heats: 3, turns: usualTurns(bar), hand: 'right', reversals: 0 }),
  forge: (bar) => forgedTo(turnedInSection(bar)),
  trace: traceTwist,
  words: {
    name: 'Twist',
    purpose: 'Twist a square or round bar about its length; ground into, it shows stars and waves.',
    instruction: (step, format) =>
      `Twist ${format.count(step.turns)} turns, ${step.hand} hand` +
      (step.reversals > 0
        ? `, direction changed ${format.count(step.reversals)} times at equal distances`
        : ''),
  },
};

/**
 * A bar whose section was turned about its length: layers across the thickness or the width now lie every way.
 * Layers across the length are their own image.
 */
export function turnedInSection(bar: BarState): BarState {
  return bar.lie === 'length' || bar.lie === 'mixed' || isSolid(bar)
    ? bar
    : { ...bar, lie: 'mixed', section: null };
}

/** About one turn for each 1.25 diameters of length: surface shear near 2.5. Common practice, no source. */
function usualTurns(bar: BarState): number {
  const diameterMm = Math.min(bar.widthMm, bar.thicknessMm);
  return Math.min(100, Math.max(1, Math.round((2 * bar.lengthMm) / (Math.PI * diameterMm)) || 1));
}
