import { type BarState, NO_LOSSES, addLosses, mapLosses, massKg } from '../bar/index.js';
import { type Bar, DEFAULT_LIMITS, type Design, steelIdsOf, steelOf } from '../design/index.js';
import type { Steel } from '../steels/index.js';
import {
  type Allowances,
  DEFAULT_ALLOWANCES,
  type Refusal,
  type Step,
  isRefused,
  kindOf,
  scaled,
} from '../steps/index.js';
import { cutPlanOf } from './cut-plan.js';
import type { ForgedBar, ForgedState, Forging } from './forging.js';
import { type Ground, startOf } from './start.js';
import { stockOf, totalsOf } from './totals.js';

/**
 * Works out every bar of a design after every step: a pure fold, each step mapping one state to the next.
 *
 * Computing stops at the first step that can't be done, for that bar and those made of it; everything before it stays.
 * @param design a document that `parseDesign` accepted
 * @param previous an earlier forging; states whose bar, steps and allowances are the very same are taken from it
 * @throws RangeError when a layer's steel is neither in the design nor in the catalogue
 */
export function evaluate(design: Design, previous?: Forging): Forging {
  const steels = steelIdsOf(design).map((id) => requireSteel(design, id));
  const allowances: Allowances = { ...DEFAULT_ALLOWANCES, ...definedOf(design.allowances) };
  const limits = { ...DEFAULT_LIMITS, ...definedOf(design.limits) };
  const reusable = previous && isSameGround(previous, steels, allowances) ? previous : undefined;
  const cutPlan = cutPlanOf(design);
  const forged = new Map<string, ForgedBar>();
  const ground: Ground = { forged, cutPlan, steels, allowances };
  let stepsForged = 0;
  for (const bar of design.bars) {
    const before = reusable && beforeOf(reusable, bar.id);
    const start = startOf(bar, ground, before);
    const states: ForgedState[] = start.state ? [start.state] : [];
    const worked = start.state
      ? workSteps(
          states,
          bar,
          allowances,
          start.state === before?.forged.states[0] ? before.forged : undefined,
        )
      : { refusal: start.refusal && { ...start.refusal, step: null }, stepsForged: 0 };
    stepsForged += worked.stepsForged;
    forged.set(bar.id, {
      id: bar.id,
      states,
      refusal: worked.refusal && { ...worked.refusal, bar: bar.id },
      overhangs: start.overhangs,
      pieces: start.pieces,
      cutInto: cutPlan.pieces.get(bar.id) ?? 0,
      endsInResult: cutPlan.endsInResult.has(bar.id),
    });
  }
  const resultBar = forged.get(design.result);
  const result = resultBar?.refusal === null ? (resultBar.states[resultBar.states.length - 1] ?? null) : null;
  return {
    design,
    allowances,
    limits,
    steels,
    bars: [...forged.values()],
    result,
    totals: result && totalsOf(design, ground, result),
    stock: stockOf(design, cutPlan),
    stepsForged,
  };
}

/** One step on one bar: the scale of its heats first, then the step itself. A step switched off changes nothing. */
export function forgeStep(
  bar: BarState,
  step: Step,
  allowances: Allowances,
): { readonly state: ForgedState } | { readonly refusal: Refusal } {
  if (step.isOff) {
    const nothing = { scale: 0, grinding: 0 };
    return { state: { step, bar, lossesKg: NO_LOSSES, heats: 0, minutesAtHeat: 0, eatenLayers: nothing } };
  }
  const afterScale = scaled(bar, step, allowances);
  if (isRefused(afterScale)) return afterScale;
  const forged = kindOf(step).forge(afterScale.bar, step, allowances);
  if (isRefused(forged)) return forged;
  const lossesMm3 = addLosses(afterScale.lossesMm3, forged.lossesMm3);
  const heats = step.heats ?? 0;
  return {
    state: {
      step,
      bar: forged.bar,
      lossesKg: mapLosses(lossesMm3, (volume) => massKg(volume, bar.densityKgM3)),
      heats,
      minutesAtHeat: heats * (step.minutesPerHeat ?? allowances.minutesPerHeat),
      eatenLayers: {
        scale: afterScale.eatenLayers.scale + forged.eatenLayers.scale,
        grinding: afterScale.eatenLayers.grinding + forged.eatenLayers.grinding,
      },
    },
  };
}

/** Adds to `states`, which holds the start, the state after each step, until one is refused. */
function workSteps(
  states: ForgedState[],
  bar: Bar,
  allowances: Allowances,
  before: ForgedBar | undefined,
): { refusal: (Refusal & { step: Step }) | null; stepsForged: number } {
  let stepsForged = 0;
  let isSameSoFar = before !== undefined;
  for (const [s, step] of bar.steps.entries()) {
    const kept = before?.states[s + 1];
    isSameSoFar &&= kept?.step === step;
    if (isSameSoFar && kept) {
      states.push(kept);
      continue;
    }
    stepsForged += 1;
    const next = forgeStep((states[states.length - 1] as ForgedState).bar, step, allowances);
    if ('refusal' in next) return { refusal: { ...next.refusal, step }, stepsForged };
    states.push(next.state);
  }
  return { refusal: null, stepsForged };
}

function beforeOf(previous: Forging, barId: string): { bar: Bar; forged: ForgedBar } | undefined {
  const bar = previous.design.bars.find((candidate) => candidate.id === barId);
  const forged = previous.bars.find((candidate) => candidate.id === barId);
  return bar && forged && { bar, forged };
}

/** Whether states of an earlier forging mean the same now: sections count in the steel table. */
function isSameGround(previous: Forging, steels: readonly Steel[], allowances: Allowances): boolean {
  const isSameTable =
    previous.steels.length === steels.length && previous.steels.every((steel, i) => steel === steels[i]);
  const names = Object.keys(allowances) as (keyof Allowances)[];
  return isSameTable && names.every((name) => previous.allowances[name] === allowances[name]);
}

function requireSteel(design: Design, id: string): Steel {
  const steel = steelOf(design, id);
  if (steel === undefined) {
    throw new RangeError(`evaluate: steel "${id}" is neither in the design nor in the catalogue`);
  }
  return steel;
}

function definedOf<T extends object>(values: Partial<T> | undefined): Partial<T> {
  return Object.fromEntries(
    Object.entries(values ?? {}).filter(([, value]) => value !== undefined),
  ) as Partial<T>;
}
