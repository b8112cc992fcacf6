import { z } from 'zod';
import { assess, evaluationSchema } from '../../shared/checks/index.js';
import { type Design, STARTERS, designSchema } from '../../shared/design/index.js';
import { type Compute, TooMuchWorkError } from '../compute/tasks.js';
import { documentFrom } from '../designs/documents.js';
import { Problem } from '../http/problem.js';
import { type RateLimitConfig, limitedByAddress } from '../http/rate-limits.js';
import type { Routes } from '../http/routes.js';

/** What a design becomes, for whoever asks. */
export function addEvaluateRoutes(routes: Routes, compute: Compute, limits: RateLimitConfig): void {
  const example = STARTERS[0]?.design;
  routes.add({
    method: 'POST',
    path: '/api/evaluate',
    limiter: limitedByAddress(limits.computations),
    body: z.unknown(),
    operation: {
      id: 'evaluate',
      tag: 'Computing',
      summary: 'Work a design out',
      description:
        'Takes a design document and gives every bar after every step, what goes in and what is lost, the carbon after ' +
        'all the heats, the warnings and the stock to cut. Keeps nothing and needs no account. When a step cannot be ' +
        'done, the answer names it, the field that asks for too much, and both numbers.',
      bodyExample: example,
      bodySchema: designSchema,
      answers: {
        200: {
          description: 'The design worked out',
          schema: evaluationSchema,
          example: example && assess(example).evaluation,
        },
      },
      problems: [
        'invalid-request',
        'malformed-json',
        'body-too-large',
        'unsupported-media-type',
        'newer-document',
        'refused-step',
        'too-much-work',
        'too-many-requests',
        'too-busy',
      ],
    },
    handle: async ({ body }) => ({ status: 200, json: await evaluated(compute, documentFrom(body, '')) }),
  });
}

async function evaluated(compute: Compute, design: Design): Promise<unknown> {
  const answer = await tried(compute, design);
  if ('evaluation' in answer) return answer.evaluation;
  const { message, ...refused } = answer.refused;
  throw new Problem('refused-step', { detail: message, members: refused });
}

async function tried(compute: Compute, design: Design) {
  try {
    return await compute.run('evaluation', design);
  } catch (error) {
    if (!(error instanceof TooMuchWorkError)) throw error;
    throw new Problem('too-much-work', { detail: 'Take fewer layers or fewer steps.' });
  }
}
