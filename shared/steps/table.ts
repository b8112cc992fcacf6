import * as z from 'zod';
import { type Corner, corner } from './corner/index.js';
import { type Dimple, dimple } from './dimple/index.js';
import { type Draw, draw } from './draw/index.js';
import { type Fold, fold } from './fold/index.js';
import { type Grind, grind } from './grind/index.js';
import { type Groove, groove } from './groove/index.js';
import { type Restack, restack } from './restack/index.js';
import { type Slice, slice } from './slice/index.js';
import { type Trim, trim } from './trim/index.js';
import { type Turn, turn } from './turn/index.js';
import { type Twist, twist } from './twist/index.js';
import { type Wedge, wedge } from './wedge/index.js';
import { type Weld, weld } from './weld/index.js';
import type { StepKind } from './step-kind.js';

/** Every kind of step, in the order in which menus offer them. Add a kind here and nowhere else. */
export const STEP_KINDS = {
  weld,
  draw,
  restack,
  fold,
  turn,
  twist,
  groove,
  dimple,
  wedge,
  corner,
  slice,
  grind,
  trim,
} as const;

export type Step =
  Weld | Draw | Restack | Fold | Turn | Twist | Groove | Dimple | Wedge | Corner | Slice | Grind | Trim;

export type StepKindName = keyof typeof STEP_KINDS;
export const STEP_KIND_NAMES = Object.keys(STEP_KINDS) as readonly StepKindName[];

/** What the program knows of `step`'s kind, typed for use with that very step. */
export function kindOf<S extends Step>(step: S): StepKind<S> {
  return STEP_KINDS[step.kind] as unknown as StepKind<S>;
}

/** The schema of any step: told apart by `kind`. */
export const stepSchema: z.ZodType<Step> = z.discriminatedUnion(
  'kind',
  Object.values(STEP_KINDS).map((entry) => entry.schema) as unknown as [z.ZodObject, ...z.ZodObject[]],
) as unknown as z.ZodType<Step>;
