import * as z from 'zod';

/** What every field of a step has: its label, whether it may be left out, and what it is for. */
interface FieldBase {
  readonly label: string;
  readonly hint?: string;
  readonly isOptional?: boolean;
  /** Used by the form when a step is new and nothing better follows from the bar. */
  readonly initial?: number | string | boolean;
}

/** A length in mm. */
export interface LengthField extends FieldBase {
  readonly type: 'length';
  readonly min: number;
  readonly max: number;
}

/** A number without a length: a count, an angle, turns, a seed. */
export interface NumberField extends FieldBase {
  readonly type: 'number';
  readonly min: number;
  readonly max: number;
  readonly isWhole: boolean;
  readonly unit: '' | '°';
}

/** One of a few named ways. */
export interface ChoiceField<V extends string = string> extends FieldBase {
  readonly type: 'choice';
  readonly options: readonly { readonly value: V; readonly label: string }[];
}

/** Yes or no. */
export interface FlagField extends FieldBase {
  readonly type: 'flag';
}

export type Field = LengthField | NumberField | ChoiceField | FlagField;
export type Fields = Readonly<Record<string, Field>>;

type ValueOf<F> =
  F extends ChoiceField<infer V> ? V : F extends FlagField ? boolean : F extends Field ? number : never;
type OptionalNames<F extends Fields> = {
  [N in keyof F]: F[N] extends { isOptional: true } ? N : never;
}[keyof F];

/** The data that a set of fields describes. */
export type FieldData<F extends Fields> = {
  readonly [N in Exclude<keyof F, OptionalNames<F>>]: ValueOf<F[N]>;
} & { readonly [N in OptionalNames<F>]?: ValueOf<F[N]> };

/** What every step has, whatever its kind. */
export interface StepBase {
  readonly id: string;
  /** Heats the step takes; absent means none. */
  readonly heats?: number;
  readonly minutesPerHeat?: number;
  readonly temperatureC?: number;
  readonly note?: string;
  /** A step switched off stays in the plan and changes nothing. */
  readonly isOff?: boolean;
}

/** A step of one kind. */
export type StepOf<K extends string, F extends Fields> = StepBase & { readonly kind: K } & FieldData<F>;

const stepBaseShape = {
  id: z.string().min(1).max(64).describe('Unique within the design'),
  heats: z.number().int().min(0).max(50).optional().describe('Heats the step takes; absent means none'),
  minutesPerHeat: z.number().min(0).max(600).optional().describe('Minutes at temperature in each heat'),
  temperatureC: z.number().min(0).max(1400).optional().describe('Working temperature, °C'),
  note: z.string().max(2000).optional(),
  isOff: z.boolean().optional().describe('A step switched off stays in the plan and changes nothing'),
};

/** The zod schema that follows from a kind and its fields; what isn't described is refused. */
export function stepSchema<K extends string, F extends Fields>(kind: K, fields: F): z.ZodType<StepOf<K, F>> {
  const shape: Record<string, z.ZodType> = { ...stepBaseShape, kind: z.literal(kind) };
  for (const [name, field] of Object.entries(fields)) {
    const value = valueSchema(field).describe(field.hint ? `${field.label}: ${field.hint}` : field.label);
    shape[name] = field.isOptional ? value.optional() : value;
  }
  return z.strictObject(shape) as unknown as z.ZodType<StepOf<K, F>>;
}

function valueSchema(field: Field): z.ZodType {
  switch (field.type) {
    case 'length':
      return z.number().min(field.min).max(field.max);
    case 'number':
      return field.isWhole
        ? z.number().int().min(field.min).max(field.max)
        : z.number().min(field.min).max(field.max);
    case 'choice':
      return z.enum(field.options.map((option) => option.value));
    case 'flag':
      return z.boolean();
  }
}
