import { contentEtag } from '../http/etag.js';
import type { Routes } from '../http/routes.js';
import { docsPage } from './docs-page.js';
import { openApiDocument } from './openapi.js';

/** The documentation, for programs and for people. */
export function addDocsRoutes(routes: Routes): void {
  // Made when it is first asked for, when every route is there.
  let json: string | undefined;
  let page: string | undefined;

  routes.add({
    method: 'GET',
    path: '/api/openapi.json',
    operation: {
      id: 'openapi',
      tag: 'Operation',
      summary: 'Get this documentation as OpenAPI',
      description: 'Every route with its schemas and an example, as an OpenAPI 3.1 document.',
      answers: {
        200: { description: 'The document', type: 'application/json', example: { openapi: '3.1.0' } },
      },
      problems: [],
    },
    handle: () => {
      json ??= JSON.stringify(openApiDocument(routes.registered));
      const headers = { ETag: contentEtag(json), 'Cache-Control': 'public, no-cache' };
      return { status: 200, bytes: json, type: 'application/json', headers };
    },
  });

  routes.add({
    method: 'GET',
    path: '/api/docs',
    operation: {
      id: 'docs',
      tag: 'Operation',
      summary: 'Read this documentation',
      description: 'A page that lists every route and every kind of problem.',
      answers: { 200: { description: 'The page', type: 'text/html', example: '<!doctype html>' } },
      problems: [],
    },
    handle: () => {
      page ??= docsPage(routes.registered);
      return { status: 200, bytes: page, type: 'html', headers: { 'Cache-Control': 'public, no-cache' } };
    },
  });
}
