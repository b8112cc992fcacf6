import { z } from 'zod';
import { steelSchema } from '../../shared/design/index.js';
import { CATALOGUE } from '../../shared/steels/index.js';
import { contentEtag } from '../http/etag.js';
import type { Routes } from '../http/routes.js';

/** The catalogue of materials. */
export function addSteelRoutes(routes: Routes): void {
  // It changes with the program only.
  const json = JSON.stringify(CATALOGUE);
  const headers = { ETag: contentEtag(json), 'Cache-Control': 'public, no-cache' };
  routes.add({
    method: 'GET',
    path: '/api/steels',
    operation: {
      id: 'listSteels',
      tag: 'Computing',
      summary: 'List the catalogue',
      description:
        'Every material that a layer can be of, with composition, density, forging range and etched tone, each with its ' +
        'source and how far it may be trusted. Asked again with If-None-Match it is answered 304.',
      answers: {
        200: {
          description: 'The materials',
          schema: z.array(steelSchema),
          example: CATALOGUE.slice(0, 1),
          headers: { ETag: 'Names this state of the catalogue' },
        },
      },
      problems: [],
    },
    handle: () => ({ status: 200, bytes: json, type: 'application/json', headers }),
  });
}
