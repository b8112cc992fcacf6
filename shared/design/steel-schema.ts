import * as z from 'zod';
import type { Steel } from '../steels/index.js';

const percent = z.number().min(0).max(100);
const text = (max: number) => z.string().max(max);
const status = z.string().max(80);

/** A steel as a design carries it along; the fields of the catalogue's `Steel`. */
export const steelSchema: z.ZodType<Steel> = z.strictObject({
  id: z.string().min(1).max(64),
  name: z.string().min(1).max(120),
  designations: z.record(text(40), text(120)),
  composition: z.record(
    text(16),
    z.strictObject({
      minPercent: percent.nullable(),
      maxPercent: percent.nullable(),
      nominalPercent: percent,
    }),
  ),
  densityKgM3: z.number().min(1_000).max(25_000),
  kind: text(60),
  etchTone: text(40),
  etchWhy: text(500),
  forging: z.strictObject({
    startMaxC: z.number().min(0).max(1_700),
    finishMinC: z.number().min(0).max(1_700),
  }),
  note: text(1_000),
  sources: z.strictObject({
    composition: z.strictObject({ text: text(1_000), status }),
    density: z.strictObject({ text: text(1_000).optional(), status }),
    forging: z.strictObject({ text: text(1_000).optional(), status }),
  }),
}) as unknown as z.ZodType<Steel>;
