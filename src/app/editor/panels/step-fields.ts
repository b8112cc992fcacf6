import type { ForgedState } from '@shared/forging';
import {
  type Allowances,
  type ChoiceField,
  type FlagField,
  type LengthField,
  type NumberField,
  type Step,
  kindOf,
} from '@shared/steps';

/** A field of a step with what stands in it. */
export type StepField = { readonly name: string } & (
  | {
      readonly type: 'length';
      readonly field: LengthField;
      readonly value: number | undefined;
      /** What holds while an optional length is left empty, mm. */
      readonly defaultMm: number | undefined;
    }
  | { readonly type: 'number'; readonly field: NumberField; readonly value: number | undefined }
  | { readonly type: 'choice'; readonly field: ChoiceField; readonly value: string | undefined }
  | { readonly type: 'flag'; readonly field: FlagField; readonly value: boolean }
);

/** Sides that follow from the others when they are left empty. */
const SIDES = ['lengthMm', 'widthMm', 'thicknessMm'] as const;

/**
 * The fields of a step's own kind, in the order in which its form shows them.
 * @param after the bar after the step; null where the step could not be done
 */
export function stepFieldsOf(
  step: Step,
  after: ForgedState | null,
  allowances: Allowances,
): readonly StepField[] {
  const values = step as unknown as Readonly<Record<string, unknown>>;
  return Object.entries(kindOf(step).fields).map(([name, field]): StepField => {
    const value = values[name];
    switch (field.type) {
      case 'length':
        return {
          name,
          type: 'length',
          field,
          value: typeof value === 'number' ? value : undefined,
          defaultMm: field.isOptional ? defaultMm(name, after, allowances) : undefined,
        };
      case 'number':
        return { name, type: 'number', field, value: typeof value === 'number' ? value : undefined };
      case 'choice':
        return { name, type: 'choice', field, value: typeof value === 'string' ? value : undefined };
      case 'flag':
        return { name, type: 'flag', field, value: value === true };
    }
  });
}

function defaultMm(name: string, after: ForgedState | null, allowances: Allowances): number | undefined {
  if (name === 'grindPerFaceMm') return allowances.seamGrindMm;
  const side = SIDES.find((candidate) => candidate === name);
  return side && after?.bar[side];
}
