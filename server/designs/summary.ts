import { z } from 'zod';
import type { DesignFigures } from '../compute/tasks.js';

export const summarySchema: z.ZodType<DesignFigures> = z.strictObject({
  layers: z
    .number()
    .nullable()
    .describe('Layers laid in the result; null while a step on the way cannot be done'),
  bars: z.number().describe('Bars in the design'),
  startMassKg: z.number().nullable().describe('All stock that goes in, kg'),
  endMassKg: z.number().nullable().describe('What the result weighs, kg'),
});

/** A summary that says nothing but how many bars there are. */
export function unknownSummary(bars: number): DesignFigures {
  return { layers: null, bars, startMassKg: null, endMassKg: null };
}

/** A summary as it was stored; one that this program cannot read says nothing. */
export function summaryFrom(json: string): DesignFigures {
  const parsed = summarySchema.safeParse(JSON.parse(json));
  return parsed.success ? parsed.data : unknownSummary(0);
}
