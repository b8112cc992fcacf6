import type { BarState } from '../bar/index.js';
import type { ForgedBar, ForgedState, Forging } from '../forging/index.js';
import {
  type WeldMethod,
  heatTemperatureC,
  isWeldingStep,
  steelsOfBar,
  weldMethodOf,
} from '../metallurgy/index.js';
import type { Steel } from '../steels/index.js';
import type { Step } from '../steps/index.js';

/** A step that is done, with the bar before it. */
export interface WorkedStep {
  readonly bar: ForgedBar;
  readonly step: Step;
  readonly before: BarState;
  readonly after: ForgedState;
}

/** The steps of a bar that are done, in order; those switched off are left out. */
export function workedSteps(bar: ForgedBar): readonly WorkedStep[] {
  return bar.states.flatMap((after, i): WorkedStep[] => {
    const before = bar.states[i - 1];
    return after.step === null || after.step.isOff || before === undefined
      ? []
      : [{ bar, step: after.step, before: before.bar, after }];
  });
}

/** {@link workedSteps} of every bar. */
export function allWorkedSteps(forging: Forging): readonly WorkedStep[] {
  return forging.bars.flatMap(workedSteps);
}

/** Id of the last step that is done, or null when the bar is as it was laid. */
export function lastStepId(bar: ForgedBar): string | null {
  const worked = workedSteps(bar);
  return worked[worked.length - 1]?.step.id ?? null;
}

/** The bar that is the billet. */
export function resultBar(forging: Forging): ForgedBar | undefined {
  return forging.bars.find((bar) => bar.id === forging.design.result);
}

/** A weld: of everything in the bar, since all of it is brought to welding heat. */
export interface WeldEvent {
  readonly bar: string;
  /** Null where no weld is planned yet for a bar that is put together. */
  readonly stepId: string | null;
  readonly method: WeldMethod;
  readonly temperatureC: number | null;
  /** Whether the step sets its temperature itself; else it is the welding heat of the allowances. */
  readonly isOwnTemperature: boolean;
  readonly steels: readonly Steel[];
}

/**
 * Every weld of a design. A bar put together that no step welds, and that goes into no later bar whose weld would do
 * it, counts as one weld under flux, so that steels that don't go together are seen as soon as they are laid.
 */
export function weldEvents(forging: Forging): readonly WeldEvent[] {
  return forging.bars.flatMap((bar): WeldEvent[] => {
    const start = bar.states[0]?.bar;
    if (start === undefined) return [];
    const steels = steelsOfBar(forging, bar.id);
    const welds = workedSteps(bar).filter(({ step }) => isWeldingStep(step));
    if (welds.length === 0 && bar.cutInto === 0 && start.openSeams > 0) {
      return [
        { bar: bar.id, stepId: null, method: 'flux', temperatureC: null, isOwnTemperature: false, steels },
      ];
    }
    return welds.map(({ step }) => ({
      bar: bar.id,
      stepId: step.id,
      method: weldMethodOf(step),
      temperatureC: heatTemperatureC(step, forging.allowances),
      isOwnTemperature: step.temperatureC !== undefined,
      steels,
    }));
  });
}

/** The first finding of each key, in order: what holds for a material is said once, where it first matters. */
export function firstOfEach<T>(items: readonly T[], key: (item: T) => string): readonly T[] {
  const seen = new Set<string>();
  return items.filter((item) => {
    const own = key(item);
    if (seen.has(own)) return false;
    seen.add(own);
    return true;
  });
}

/** Where a material is first laid: the bar. */
export function firstBarWith(forging: Forging, steelId: string): string | undefined {
  return forging.design.bars.find(
    (bar) => bar.start.kind === 'stack' && bar.start.layers.some((layer) => layer.steel === steelId),
  )?.id;
}
