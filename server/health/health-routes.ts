import { z } from 'zod';
import type { Routes } from '../http/routes.js';
import type { Health } from './health.js';

const healthSchema = z.strictObject({
  status: z.enum(['ready', 'not-ready']),
  checks: z.strictObject({
    database: z.boolean().describe('Rows can be read'),
    disk: z.boolean().describe('What is changed can be put on disk'),
    accepting: z.boolean().describe('The server is not about to end'),
  }),
});

const liveSchema = z.strictObject({ status: z.literal('live') });

/** For whatever watches over the server. */
export function addHealthRoutes(routes: Routes, health: Health): void {
  routes.add({
    method: 'GET',
    path: '/api/health',
    operation: {
      id: 'health',
      tag: 'Operation',
      summary: 'Say whether the server is ready',
      description:
        'Ready means that designs can be read and changes can be kept. Answered 503 when they cannot.',
      answers: {
        200: {
          description: 'Ready',
          schema: healthSchema,
          example: { status: 'ready', checks: { database: true, disk: true, accepting: true } },
        },
        503: {
          description: 'Not ready; the checks say why',
          schema: healthSchema,
          example: { status: 'not-ready', checks: { database: true, disk: false, accepting: true } },
        },
      },
      problems: [],
    },
    handle: async () => {
      const checks = await health.checks();
      const isReady = Object.values(checks).every(Boolean);
      return { status: isReady ? 200 : 503, json: { status: isReady ? 'ready' : 'not-ready', checks } };
    },
  });

  routes.add({
    method: 'GET',
    path: '/api/health/live',
    operation: {
      id: 'live',
      tag: 'Operation',
      summary: 'Say whether the process runs',
      description:
        'Touches neither disk nor database: a process that does not answer this has to be started anew.',
      answers: { 200: { description: 'It runs', schema: liveSchema, example: { status: 'live' } } },
      problems: [],
    },
    handle: () => ({ status: 200, json: { status: 'live' } }),
  });
}
