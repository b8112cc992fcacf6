import * as z from 'zod';
import type { Steel } from '../steels/index.js';
import { ALLOWANCE_DEFAULTS, type Allowances, type Step, stepSchema } from '../steps/index.js';
import { type Blank, blankSchema } from './blank.js';
import { LIMIT_DEFAULTS, type ShopLimits } from './limits.js';
import { steelSchema } from './steel-schema.js';

// A strict content security policy forbids code made at run time; zod falls back on it unless told not to.
z.config({ jitless: true });

export const DESIGN_FORMAT = 'layerwright.design';
/** The version of the document that this program writes. */
export const DESIGN_VERSION = 1;

export const MAX_BARS = 40;
export const MAX_STEPS = 60;
export const MAX_LAYERS = 400;
export const MAX_PIECES = 64;

/** One layer of a stack. */
export interface Layer {
  readonly steel: string;
  readonly thicknessMm: number;
}

/** Layers laid on each other, bottom first. */
export interface Stack {
  readonly kind: 'stack';
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly layers: readonly Layer[];
}

/** A length of an earlier bar, as it is laid into an assembly. */
export interface Piece {
  readonly bar: string;
  /** Quarter turns about the length, each taking the top to the right. */
  readonly quarterTurns?: 0 | 1 | 2 | 3;
  /** Half a turn about the thickness axis: x = L - x, y = W - y. */
  readonly endForEnd?: boolean;
}

/** Pieces laid on each other (along the thickness, bottom first) or side by side (along the width, left first). */
export interface Assembly {
  readonly kind: 'assembly';
  readonly along: 'thickness' | 'width';
  readonly pieces: readonly Piece[];
}

export interface Bar {
  readonly id: string;
  readonly name: string;
  readonly start: Stack | Assembly;
  readonly steps: readonly Step[];
}

/** The design document, version 1. Lengths mm, masses kg, temperatures °C, times minutes. */
export interface Design {
  readonly format: typeof DESIGN_FORMAT;
  readonly version: typeof DESIGN_VERSION;
  readonly name: string;
  readonly note?: string;
  /** Snapshot of steels that the design uses and the catalogue may not have; they go before the catalogue. */
  readonly steels?: readonly Steel[];
  /** 1 to 40; a bar uses only bars before it. */
  readonly bars: readonly Bar[];
  /** Id of the bar that is the billet. */
  readonly result: string;
  readonly blank?: Blank;
  readonly allowances?: Partial<Allowances>;
  readonly limits?: Partial<ShopLimits>;
  /** How uneven the hammer leaves the layers, 0–1; in pictures only. */
  readonly unevenness?: number;
  readonly seed?: number;
}

const id = z.string().min(1).max(64);
const sizeMm = (max: number) => z.number().min(0.1).max(max);

const layerSchema = z.strictObject({
  steel: id.describe('Id of a steel of the catalogue or of the design'),
  thicknessMm: z.number().min(0.01).max(500),
});

const stackSchema = z.strictObject({
  kind: z.literal('stack'),
  lengthMm: sizeMm(5_000),
  widthMm: sizeMm(1_000),
  layers: z.array(layerSchema).min(1).max(MAX_LAYERS).describe('Bottom layer first'),
});

const pieceSchema = z.strictObject({
  bar: id,
  quarterTurns: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]).optional(),
  endForEnd: z.boolean().optional(),
});

const assemblySchema = z.strictObject({
  kind: z.literal('assembly'),
  along: z.enum(['thickness', 'width']),
  pieces: z.array(pieceSchema).min(2).max(MAX_PIECES).describe('Bottom or left piece first'),
});

const barSchema = z.strictObject({
  id,
  name: z.string().min(1).max(120),
  start: z.discriminatedUnion('kind', [stackSchema, assemblySchema]),
  steps: z.array(stepSchema).max(MAX_STEPS),
});

/** Optional numbers within the limits that a table of defaults gives. */
function partialOf<K extends string>(
  defaults: Readonly<Record<K, { readonly min: number; readonly max: number; readonly label: string }>>,
): z.ZodType<{ readonly [N in K]?: number }> {
  const shape: Record<string, z.ZodType> = {};
  for (const name of Object.keys(defaults) as K[]) {
    const { min, max, label } = defaults[name];
    shape[name] = z.number().min(min).max(max).optional().describe(label);
  }
  return z.strictObject(shape) as unknown as z.ZodType<{ readonly [N in K]?: number }>;
}

/** The shape of a design document; what ties its parts together is checked by `designProblems`. */
export const designSchema: z.ZodType<Design> = z.strictObject({
  format: z.literal(DESIGN_FORMAT),
  version: z.literal(DESIGN_VERSION),
  name: z.string().min(1).max(120),
  note: z.string().max(10_000).optional(),
  steels: z.array(steelSchema).max(60).optional(),
  bars: z.array(barSchema).min(1).max(MAX_BARS),
  result: id,
  blank: blankSchema.optional(),
  allowances: partialOf(ALLOWANCE_DEFAULTS).optional(),
  limits: partialOf(LIMIT_DEFAULTS).optional(),
  unevenness: z.number().min(0).max(1).optional(),
  seed: z.number().int().min(0).max(2_147_483_647).optional(),
});
