import type { Bar, Design } from '@shared/design';

/** What of a design is being looked at and worked on. */
export interface Selection {
  readonly barId: string;
  /** Null: the bar's start. */
  readonly stepId: string | null;
  /** Places of layers in the stack, 0 at the bottom; empty unless the start of a stack is selected. */
  readonly layers: ReadonlySet<number>;
}

export const NO_LAYERS: ReadonlySet<number> = new Set();

/** The start of the bar that is the result, or of the bar that everything begins with. */
export function firstSelection(design: Design): Selection {
  const [first] = design.bars as readonly [Bar, ...Bar[]];
  return { barId: design.bars.length === 1 ? design.result : first.id, stepId: null, layers: NO_LAYERS };
}

/**
 * The selection as far as the design still has what it names: a step that went gives way to the bar's start, a bar
 * that went to the result.
 */
export function selectionWithin(design: Design, selection: Selection): Selection {
  const bar = design.bars.find((candidate) => candidate.id === selection.barId);
  if (bar === undefined) return { barId: design.result, stepId: null, layers: NO_LAYERS };
  if (selection.stepId !== null && !bar.steps.some((step) => step.id === selection.stepId)) {
    return { barId: bar.id, stepId: null, layers: NO_LAYERS };
  }
  if (selection.layers.size === 0) return selection;
  if (selection.stepId !== null || bar.start.kind !== 'stack') return { ...selection, layers: NO_LAYERS };
  const count = bar.start.layers.length;
  const isWithin = [...selection.layers].every((place) => place < count);
  return isWithin
    ? selection
    : { ...selection, layers: new Set([...selection.layers].filter((place) => place < count)) };
}
