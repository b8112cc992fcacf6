import { z } from 'zod';
import { STARTERS, designSchema } from '../../shared/design/index.js';
import { etagOf, requiredIfMatch } from '../http/etag.js';
import type { ProblemCode } from '../http/problem.js';
import type { Answer, Routes } from '../http/routes.js';
import type { StoredDesign } from './design-repository.js';
import type { DesignService } from './design-service.js';
import { documentFrom, storedDocument } from './documents.js';
import { summarySchema } from './summary.js';

/** The document is checked by itself, so that its own errors and a newer version can be told apart. */
const bodySchema = z.strictObject({ document: z.unknown() });
const documentedBodySchema = z.strictObject({ document: designSchema });

const listedShape = {
  id: z.string(),
  name: z.string(),
  revision: z.number(),
  updatedAt: z.string().describe('UTC, ISO 8601'),
  summary: summarySchema,
};
export const listSchema = z.array(z.strictObject(listedShape));
export const designBodySchema = z.strictObject({
  ...listedShape,
  createdAt: z.string().describe('UTC, ISO 8601'),
  document: designSchema,
});

const listQuerySchema = z.object({
  q: z.string().trim().max(200).default('').describe('Only designs with this in their name'),
});

const ID = '3f9b6f0e-55b1-4a7e-8a43-0d2f6a0c7d11';
const DOCUMENT = STARTERS[0]?.design;
const EXAMPLE = {
  id: ID,
  name: DOCUMENT?.name,
  revision: 1,
  createdAt: '2026-03-01T08:30:00.000Z',
  updatedAt: '2026-03-01T08:30:00.000Z',
  summary: { layers: 28, bars: 1, startMassKg: 1.62, endMassKg: 1.38 },
  document: DOCUMENT,
};
const { document: _document, createdAt: _createdAt, ...LISTED } = EXAMPLE;

const PARAMS = { id: 'The design' };
const NEEDS_TOKEN = { 'x-csrf-token': 'The token from /api/auth/csrf' };
const NEEDS_REVISION = { ...NEEDS_TOKEN, 'If-Match': 'The ETag of the revision that this changes' };
const ETAG = { ETag: 'Names this revision; a change sends it back as If-Match' };
const OWN: readonly ProblemCode[] = ['sign-in-required', 'not-found'];
const CHANGING: readonly ProblemCode[] = [
  'sign-in-required',
  'csrf-token',
  'cross-site',
  'storage-unavailable',
];
const DOCUMENT_PROBLEMS: readonly ProblemCode[] = [
  'invalid-request',
  'malformed-json',
  'body-too-large',
  'unsupported-media-type',
  'newer-document',
];

/** Designs: listing, keeping, changing, deleting and bringing back. */
export function addDesignRoutes(routes: Routes, service: DesignService): void {
  routes.add({
    method: 'GET',
    path: '/api/designs',
    query: listQuerySchema,
    operation: {
      id: 'listDesigns',
      tag: 'Designs',
      summary: 'List my designs',
      description:
        'The designs of the account, the one changed last first, each with a summary and without its document.',
      answers: { 200: { description: 'The designs', schema: listSchema, example: [LISTED] } },
      problems: ['sign-in-required', 'invalid-request'],
    },
    handle: async ({ account, query }) => ({ status: 200, json: await service.list(account.id, query.q) }),
  });

  routes.add({
    method: 'POST',
    path: '/api/designs',
    body: bodySchema,
    operation: {
      id: 'addDesign',
      tag: 'Designs',
      summary: 'Keep a new design',
      description: 'Keeps a design document as a new design; sent the document of another, it makes a copy.',
      headers: NEEDS_TOKEN,
      bodySchema: documentedBodySchema,
      bodyExample: { document: DOCUMENT },
      answers: {
        201: {
          description: 'The design as it is kept',
          schema: designBodySchema,
          example: EXAMPLE,
          headers: { ...ETAG, Location: 'Where the design is' },
        },
      },
      problems: [...CHANGING, ...DOCUMENT_PROBLEMS, 'too-many-designs'],
    },
    handle: async ({ account, body }) => {
      const design = await service.create(account.id, documentFrom(body.document, '/document'));
      return answerWith(design, 201, { Location: `/api/designs/${design.id}` });
    },
  });

  routes.add({
    method: 'GET',
    path: '/api/designs/:id',
    operation: {
      id: 'getDesign',
      tag: 'Designs',
      summary: 'Open a design',
      description: 'A design with its document, and the ETag that a change of it needs.',
      params: PARAMS,
      answers: {
        200: { description: 'The design', schema: designBodySchema, example: EXAMPLE, headers: ETAG },
      },
      problems: OWN,
    },
    handle: async ({ params }) => answerWith(await service.get(idIn(params)), 200),
  });

  routes.add({
    method: 'PUT',
    path: '/api/designs/:id',
    body: bodySchema,
    operation: {
      id: 'saveDesign',
      tag: 'Designs',
      summary: 'Save a design',
      description:
        'Puts a new document in the place of the revision that If-Match names. When someone has saved in between, ' +
        'nothing is changed and the answer says which revision is there now.',
      params: PARAMS,
      headers: NEEDS_REVISION,
      bodySchema: documentedBodySchema,
      bodyExample: { document: DOCUMENT },
      answers: {
        200: {
          description: 'The design as it is kept now',
          schema: designBodySchema,
          example: { ...EXAMPLE, revision: 2 },
          headers: ETAG,
        },
      },
      problems: [
        ...CHANGING,
        'not-found',
        ...DOCUMENT_PROBLEMS,
        'revision-required',
        'stale-revision',
        'newer-stored-document',
      ],
    },
    handle: async ({ params, body, request }) => {
      const ifMatch = requiredIfMatch(request.get('If-Match'));
      const document = documentFrom(body.document, '/document');
      return answerWith(await service.save(idIn(params), document, ifMatch), 200);
    },
  });

  routes.add({
    method: 'DELETE',
    path: '/api/designs/:id',
    operation: {
      id: 'deleteDesign',
      tag: 'Designs',
      summary: 'Delete a design',
      description: 'Takes a design off the bench. For thirty days it can be brought back.',
      params: PARAMS,
      headers: NEEDS_REVISION,
      answers: { 204: { description: 'The design is deleted' } },
      problems: [...CHANGING, 'not-found', 'revision-required', 'stale-revision'],
    },
    handle: async ({ params, request }) => {
      await service.delete(idIn(params), requiredIfMatch(request.get('If-Match')));
      return { status: 204 };
    },
  });

  routes.add({
    method: 'POST',
    path: '/api/designs/:id/restore',
    operation: {
      id: 'restoreDesign',
      tag: 'Designs',
      summary: 'Bring a deleted design back',
      description: 'Undoes a deletion. A design that was not deleted is answered as it is.',
      params: PARAMS,
      headers: NEEDS_TOKEN,
      answers: {
        200: {
          description: 'The design, back on the bench',
          schema: designBodySchema,
          example: { ...EXAMPLE, revision: 3 },
          headers: ETAG,
        },
      },
      problems: [...CHANGING, 'not-found'],
    },
    handle: async ({ params }) => answerWith(await service.restore(idIn(params)), 200),
  });
}

function answerWith(
  design: StoredDesign,
  status: number,
  headers: Readonly<Record<string, string>> = {},
): Answer {
  const { id, name, revision, createdAt, updatedAt, summary, documentJson } = design;
  const document = storedDocument(documentJson);
  return {
    status,
    json: { id, name, revision, createdAt, updatedAt, summary, document },
    headers: { ETag: etagOf(design), ...headers },
  };
}

function idIn(params: Readonly<Record<string, string>>): string {
  return params['id'] ?? '';
}
