import type { Allowances, Step } from '../steps/index.js';
import type { WeldMethod } from './welding-window.js';

/** Kinds of step whose heats are welding heats: the wedge's cut is welded shut. */
const WELDING_KINDS: ReadonlySet<Step['kind']> = new Set<Step['kind']>(['weld', 'wedge']);

/** Whether a step's heats are welding heats. */
export function isWeldingStep(step: Step): boolean {
  return WELDING_KINDS.has(step.kind);
}

/** How a welding step keeps the air out; flux where it doesn't say. */
export function weldMethodOf(step: Step): WeldMethod {
  return step.kind === 'weld' ? (step.method ?? 'flux') : 'flux';
}

/** Temperature of a step's heats, °C: its own, else the welding or forging heat of the allowances. */
export function heatTemperatureC(step: Step, allowances: Allowances): number {
  return (
    step.temperatureC ?? (isWeldingStep(step) ? allowances.weldTemperatureC : allowances.forgeTemperatureC)
  );
}
