import type { Request } from 'express';
import { z } from 'zod';
import { PAPERS, type Paper } from '../pdf/sheet.js';
import type { ProblemCode } from '../http/problem.js';
import type { Answer, Routes } from '../http/routes.js';
import type { CardService, SheetRequest } from './card-service.js';

const querySchema = z.object({
  paper: z
    .enum(Object.keys(PAPERS) as [Paper, ...Paper[]])
    .default('a5')
    .describe('Paper of the sheet'),
  units: z.enum(['mm', 'inch']).default('mm').describe('Units of every figure'),
});

const PROBLEMS: readonly ProblemCode[] = ['sign-in-required', 'not-found', 'invalid-request'];
const PARAMS = { id: 'The design' };

/** The sheets of a design as PDF. */
export function addCardRoutes(routes: Routes, service: CardService): void {
  routes.add({
    method: 'GET',
    path: '/api/designs/:id/card.pdf',
    query: querySchema,
    operation: {
      id: 'getForgeCard',
      tag: 'Sheets',
      summary: 'Print the forge card',
      description:
        'The sheet for the anvil: every step with the sizes to reach, room for the real ones, cautions, and a code that leads back to the design.',
      params: PARAMS,
      answers: { 200: { description: 'The forge card', type: 'application/pdf' } },
      problems: PROBLEMS,
    },
    handle: async ({ params, query, request }) =>
      pdf(await service.forgeCard(sheetRequest(params, query, request)), 'forge-card'),
  });

  routes.add({
    method: 'GET',
    path: '/api/designs/:id/cut-sheet.pdf',
    query: querySchema,
    operation: {
      id: 'getCutSheet',
      tag: 'Sheets',
      summary: 'Print the cut sheet',
      description:
        'What to cut before the first heat: each size of each steel, with the length of bar it uses up.',
      params: PARAMS,
      answers: { 200: { description: 'The cut sheet', type: 'application/pdf' } },
      problems: PROBLEMS,
    },
    handle: async ({ params, query, request }) =>
      pdf(await service.cutSheet(sheetRequest(params, query, request)), 'cut-sheet'),
  });
}

function sheetRequest(
  params: Readonly<Record<string, string>>,
  query: z.infer<typeof querySchema>,
  request: Request,
): SheetRequest {
  return {
    designId: params['id'] ?? '',
    paper: query.paper,
    units: query.units,
    languages: request.acceptsLanguages(),
    reachedAt: `${request.protocol}://${request.get('host') ?? 'localhost'}`,
  };
}

function pdf(sheet: { readonly bytes: Uint8Array; readonly revision: number }, name: string): Answer {
  return {
    status: 200,
    bytes: sheet.bytes,
    type: 'application/pdf',
    headers: { 'Content-Disposition': `inline; filename="${name}-revision-${sheet.revision}.pdf"` },
  };
}
