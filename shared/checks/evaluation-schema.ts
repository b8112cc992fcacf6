import * as z from 'zod';
import { WARNING_SEVERITIES } from './check.js';
import type { Evaluation } from './evaluation.js';

const mm = (text: string): z.ZodNumber => z.number().min(0).describe(`${text}, mm`);
const kg = (text: string): z.ZodNumber => z.number().describe(`${text}, kg`);
const count = (text: string): z.ZodNumber => z.number().int().min(0).describe(text);

const lossesKg = z
  .object({
    scale: kg('Burned to scale'),
    kerf: kg('Saw cuts'),
    grinding: kg('Ground off'),
    cutting: kg('Cut out: grooves and dimples'),
    trim: kg('Cropped, and left over'),
  })
  .describe('Losses by cause, kg');

const state = z
  .object({
    stepId: z.string().nullable().describe('Null for the start'),
    lengthMm: mm('Along x, from the near end'),
    widthMm: mm('Along y, from the left side'),
    thicknessMm: mm('Along z, from the bottom'),
    volumeMm3: z.number().min(0).describe('mm³'),
    massKg: kg('Mass'),
    layers: count('Layers laid, counted through'),
    bands: count('Bands that can be told apart')
      .nullable()
      .describe('Null where no straight walk shows them all'),
    lie: z.enum(['thickness', 'width', 'length', 'mixed']).describe('Axis across which the layers lie'),
    layerThicknessMm: z
      .object({ min: mm('Thinnest'), mean: mm('Mean'), max: mm('Thickest') })
      .nullable()
      .describe('Of the layers that are left; null where bands is'),
    heats: count('Heats of this step'),
    minutesAtHeat: z.number().min(0).describe('Minutes at temperature in this step'),
    lossesKg,
  })
  .describe('A bar after a step');

const refusal = z
  .object({
    code: z.enum([
      'nothing-left',
      'too-short',
      'cut-too-deep',
      'size-impossible',
      'too-many-layers',
      'unknown-steel',
      'piece-refused',
    ]),
    stepId: z.string().nullable().describe('Null when the pieces of the bar make no bar'),
    field: z.string().describe('What asks for too much'),
    asked: z.number(),
    available: z.number(),
    unit: z.enum(['mm', 'layers', 'pieces']),
    message: z.string(),
  })
  .describe('Why the bar stops here');

const warning = z.object({
  code: z.string().describe('Stable name of the rule'),
  severity: z.enum(WARNING_SEVERITIES),
  bar: z.string().describe('Id of the bar'),
  stepId: z.string().nullable().describe('Null for what the bar is laid from'),
  message: z.string().describe('What is wrong, with the numbers, and why'),
  values: z.record(z.string(), z.union([z.number(), z.string()])).describe('The figures it rests on'),
  source: z.string().describe('Where the rule comes from'),
  remedy: z.string().describe('What to do'),
});

const carbon = z
  .object({
    meanPercent: z.number().describe('By mass, over the materials that exchange carbon, wt%'),
    levelled: z.number().min(0).max(1).describe('0 as laid, 1 level in activity'),
    layers: z.array(
      z.object({
        steel: z.string().describe('Id of the material'),
        startPercent: z.number().min(0),
        endPercent: z.number().min(0),
      }),
    ),
    barriers: z.array(z.string()).describe('Materials planned as barriers to carbon'),
  })
  .describe('Carbon after all heats, an estimate');

/** The answer of `POST /api/evaluate`, for its documentation and for tests of what is sent. */
export const evaluationSchema: z.ZodType<Evaluation> = z
  .object({
    bars: z
      .record(z.string(), z.object({ states: z.array(state), refusal: refusal.optional() }))
      .describe('By id of the bar'),
    result: state.nullable().describe('The billet after its last step; null while a step is refused'),
    totals: z
      .object({
        startMassKg: kg('All stock that goes in'),
        endMassKg: kg('What comes out'),
        yieldPercent: z.number(),
        welds: count('Welds'),
        heats: count('Heats'),
        lossesKg,
      })
      .nullable(),
    carbon: carbon.nullable(),
    warnings: z.array(warning).describe('Gravest first'),
    stock: z.array(
      z.object({
        steel: z.string(),
        thicknessMm: mm('Thickness'),
        widthMm: mm('Width'),
        lengthMm: mm('Length'),
        pieces: count('Pieces of this size'),
      }),
    ),
  })
  .describe('A design worked out');
