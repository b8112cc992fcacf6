import type { Step } from '../../steps/index.js';
import type { Design } from '../schema.js';
import { withBar } from './bars.js';

/** Puts a step into a bar's plan so that it gets the place `at`. */
export function insertStep(design: Design, barId: string, at: number, step: Step): Design {
  return changeSteps(design, barId, (steps) => [...steps.slice(0, at), step, ...steps.slice(at)]);
}

export function removeStep(design: Design, barId: string, stepId: string): Design {
  return changeSteps(design, barId, (steps) => steps.filter((step) => step.id !== stepId));
}

/** Moves a step to the place `to`, counted without it. */
export function moveStep(design: Design, barId: string, stepId: string, to: number): Design {
  return changeSteps(design, barId, (steps) => {
    const from = steps.findIndex((step) => step.id === stepId);
    const moved = steps[from];
    if (moved === undefined || from === to) return steps;
    const rest = steps.filter((step) => step !== moved);
    return [...rest.slice(0, to), moved, ...rest.slice(to)];
  });
}

/** Changes fields of a step; `undefined` takes an optional field away. */
export function editStep(
  design: Design,
  barId: string,
  stepId: string,
  fields: Readonly<Record<string, string | number | boolean | undefined>>,
): Design {
  return changeSteps(design, barId, (steps) =>
    steps.map((step) => (step.id === stepId ? withFields(step, fields) : step)),
  );
}

/** A copy of a step right behind it. */
export function duplicateStep(design: Design, barId: string, stepId: string, newId: string): Design {
  return changeSteps(design, barId, (steps) =>
    steps.flatMap((step) => (step.id === stepId ? [step, { ...step, id: newId }] : [step])),
  );
}

/** Switches a step off, or on again. */
export function toggleStep(design: Design, barId: string, stepId: string): Design {
  return changeSteps(design, barId, (steps) =>
    steps.map((step) =>
      step.id === stepId ? withFields(step, { isOff: step.isOff ? undefined : true }) : step,
    ),
  );
}

/** Copies a run of steps (by place, `to` not included) to the end of another bar. */
export function copySteps(
  design: Design,
  fromBarId: string,
  from: number,
  to: number,
  toBarId: string,
  newId: () => string,
): Design {
  const source = design.bars.find((bar) => bar.id === fromBarId);
  const copies = (source?.steps.slice(from, to) ?? []).map((step) => ({ ...step, id: newId() }));
  return copies.length === 0 ? design : changeSteps(design, toBarId, (steps) => [...steps, ...copies]);
}

function withFields(
  step: Step,
  fields: Readonly<Record<string, string | number | boolean | undefined>>,
): Step {
  const next: Record<string, unknown> = { ...step };
  for (const [name, value] of Object.entries(fields)) {
    if (value === undefined) delete next[name];
    else next[name] = value;
  }
  const isSame = Object.keys({ ...step, ...next }).every(
    (name) => next[name] === (step as unknown as Record<string, unknown>)[name],
  );
  return isSame ? step : (next as unknown as Step);
}

function changeSteps(
  design: Design,
  barId: string,
  change: (steps: readonly Step[]) => readonly Step[],
): Design {
  return withBar(design, barId, (bar) => {
    const steps = change(bar.steps);
    const isSame = steps.length === bar.steps.length && steps.every((step, i) => step === bar.steps[i]);
    return isSame ? bar : { ...bar, steps };
  });
}
