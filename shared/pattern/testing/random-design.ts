import type { Bar, Design, Layer, Piece } from '../../design/index.js';
import { evaluate } from '../../forging/index.js';
import { type StepPlan, barFrom, designOf, stackOf } from '../../forging/testing/designs.js';
import type { Step } from '../../steps/index.js';
import { type Random, between, chance, oneOf, randomFrom, wholeBetween } from './random.js';

/** What random designs may contain. */
export interface RandomDesignLimits {
  readonly bars: number;
  readonly steps: number;
  /** Folds and restacks, each counted once, in one bar. */
  readonly folds: number;
  readonly isStraight?: boolean;
}

const USUAL: RandomDesignLimits = { bars: 4, steps: 10, folds: 4 };
const STEELS = ['1084', '15n20', '1095', 'wrought-iron', 'nickel-200'];

/**
 * A valid design, the same for the same seed: every step can be done. `isStraight` leaves out the steps that bend.
 * @throws RangeError when the seed makes none, which no seed should
 */
export function randomDesign(seed: number, limits: RandomDesignLimits = USUAL): Design {
  const random = randomFrom(seed);
  const bars: Bar[] = [];
  const count = wholeBetween(random, 1, limits.bars);
  for (let b = 0; b < count; b++) {
    const isStack = b === 0 || chance(random, 0.5);
    const start = isStack ? randomStack(random) : randomAssembly(random, bars);
    addBar(bars, barFrom(`bar${b}`, start));
    if (bars[b] === undefined) break;
    growSteps(random, bars, limits);
  }
  const rest = {
    allowances: {
      scaleMmPerHeat: between(random, 0, 0.1),
      kerfMm: between(random, 0, 2),
      seamGrindMm: between(random, 0, 0.5),
    },
    ...(chance(random, 0.3) && !limits.isStraight && { unevenness: random() }),
    seed: wholeBetween(random, 0, 1_000_000),
  };
  return shortened(designOf(bars, rest));
}

function randomStack(random: Random): Bar['start'] {
  const layers: Layer[] = Array.from({ length: wholeBetween(random, 1, 24) }, () => ({
    steel: oneOf(random, STEELS),
    thicknessMm: between(random, 0.5, 4),
  }));
  return stackOf(layers, between(random, 60, 400), between(random, 15, 60));
}

function randomAssembly(random: Random, bars: readonly Bar[]): Bar['start'] {
  const pieces: Piece[] = Array.from({ length: wholeBetween(random, 2, 6) }, () => ({
    bar: oneOf(random, bars).id,
    ...(chance(random, 0.6) && { quarterTurns: wholeBetween(random, 0, 3) as 0 | 1 | 2 | 3 }),
    ...(chance(random, 0.3) && { endForEnd: true }),
  }));
  return { kind: 'assembly', along: oneOf(random, ['thickness', 'width'] as const), pieces };
}

function addBar(bars: Bar[], bar: Bar): void {
  const tried = [...bars, bar];
  if (evaluate(designOf(tried)).bars.every((forged) => forged.refusal === null)) bars.push(bar);
}

/** Adds steps to the last bar one by one, leaving out what can't be done. */
function growSteps(random: Random, bars: Bar[], limits: RandomDesignLimits): void {
  const wanted = wholeBetween(random, 0, limits.steps);
  let forging = evaluate(designOf(bars));
  let folds = 0;
  for (let s = 0; s < wanted; s++) {
    const bar = bars[bars.length - 1] as Bar;
    const state = forging.result?.bar;
    if (!state) return;
    const plan = randomStep(random, state, limits.isStraight ?? false);
    if ((plan.kind === 'fold' || plan.kind === 'restack') && ++folds > limits.folds) continue;
    const step = { ...plan, id: `${bar.id}-${s + 1}` } as Step;
    const grown = { ...bar, steps: [...bar.steps, step] };
    const tried = evaluate(designOf([...bars.slice(0, -1), grown]), forging);
    if (tried.result === null) continue;
    forging = tried;
    bars[bars.length - 1] = grown;
  }
}

type Size = { readonly lengthMm: number; readonly widthMm: number; readonly thicknessMm: number };

function randomStep(random: Random, bar: Size, isStraight: boolean): StepPlan {
  const straight = ['weld', 'draw', 'restack', 'fold', 'turn', 'slice', 'grind', 'trim'] as const;
  const bent = ['twist', 'groove', 'dimple', 'wedge', 'corner'] as const;
  const kind = oneOf(random, isStraight ? straight : [...straight, ...bent, ...bent]);
  const faces = oneOf(random, ['top', 'bothStaggered', 'bothOpposed'] as const);
  const finish = oneOf(random, ['forgeFlat', 'grindFlat'] as const);
  const depthMm = between(random, 0, bar.thicknessMm * 0.4);
  const heats = wholeBetween(random, 0, 2);
  switch (kind) {
    case 'weld':
      return { kind, heats, ...(chance(random, 0.5) && { thicknessMm: bar.thicknessMm * 0.8 }) };
    case 'draw':
      return { kind, heats, widthMm: between(random, 15, 50), thicknessMm: between(random, 6, 40) };
    case 'restack':
      return { kind, pieces: wholeBetween(random, 2, 6), turnAlternate: chance(random, 0.5) };
    case 'fold':
      return { kind, heats };
    case 'turn':
      return { kind, onto: chance(random, 0.7) ? 'edge' : 'end' };
    case 'slice': {
      const sliceMm = between(random, 2, 8);
      const count = wholeBetween(random, 1, Math.max(1, Math.floor(bar.lengthMm / (sliceMm + 2))));
      return { kind, sliceMm, count: Math.min(40, count), turnAlternate: chance(random, 0.5) };
    }
    case 'grind':
      return { kind, perFaceMm: between(random, 0, 0.6), faces: chance(random, 0.5) ? 'flats' : 'all' };
    case 'trim':
      return { kind, perEndMm: between(random, 0, 5) };
    case 'twist':
      return {
        kind,
        turns: between(random, 0.2, 12),
        hand: chance(random, 0.5) ? 'left' : 'right',
        reversals: wholeBetween(random, 0, 3),
      };
    case 'groove':
      return {
        kind,
        heats,
        pitchMm: between(random, 3, 25),
        depthMm,
        radiusMm: between(random, 0.5, 8),
        angleDeg: chance(random, 0.5) ? 0 : between(random, -75, 75),
        faces,
        finish,
      };
    case 'dimple':
      return {
        kind,
        heats,
        pitchMm: between(random, 8, 30),
        rowPitchMm: between(random, 8, 30),
        depthMm,
        radiusMm: between(random, 0.5, 8),
        layout: oneOf(random, ['square', 'staggered', 'scattered'] as const),
        seed: wholeBetween(random, 0, 2_147_483_647),
        faces,
        finish,
      };
    case 'wedge':
      return { kind, dragMm: between(random, 0, bar.thicknessMm * 0.6), reachMm: between(random, 1, 10) };
    case 'corner':
      return { kind, heats };
  }
}

/** Drops bars from the end until the design can be done with its own allowances. */
function shortened(design: Design): Design {
  if (evaluate(design).result !== null) return design;
  const bars = design.bars.slice(0, -1);
  const [first] = design.bars;
  if (bars.length > 0) return shortened({ ...design, bars, result: (bars[bars.length - 1] as Bar).id });
  if (!first || first.steps.length === 0) throw new RangeError('randomDesign: no valid design');
  return shortened({ ...design, bars: [{ ...first, steps: first.steps.slice(0, -1) }] });
}
