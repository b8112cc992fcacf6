import type { z } from 'zod';
import { PROBLEMS } from '../http/problem.js';
import type { RegisteredRoute } from '../http/routes.js';
import { type TestSite, testSite } from '../testing/test-site.js';
import { openApiDocument } from './openapi.js';

describe('the documentation', () => {
  let site: TestSite;

  beforeAll(async () => {
    site = await testSite();
  });

  afterAll(() => site.close());

  it('describes every route, every body and every answer, each with an example', () => {
    for (const route of site.routes.registered) {
      const { operation } = route;
      const context = `${route.method} ${route.path}`;
      expect(operation.summary.length).withContext(context).toBeGreaterThan(5);
      expect(operation.description.length).withContext(context).toBeGreaterThan(20);
      expect(Object.keys(operation.answers).length).withContext(context).toBeGreaterThan(0);
      for (const name of route.path.matchAll(/:(\w+)/g)) {
        expect(operation.params?.[name[1]!]).withContext(`${context} ${name[1]}`).toBeDefined();
      }
      if (route.body) expect(operation.bodyExample).withContext(context).toBeDefined();
      for (const [status, answer] of Object.entries(operation.answers)) {
        expect(answer.description).withContext(context).toBeTruthy();
        if (answer.schema || answer.type?.startsWith('text/'))
          expect(answer.example).withContext(`${context} ${status}`).toBeDefined();
      }
    }
  });

  it('has names for operations that are used once', () => {
    const ids = site.routes.registered.map(({ operation }) => operation.id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('gives examples that its own schemas accept', () => {
    for (const route of site.routes.registered) {
      for (const schema of [route.body, route.operation.bodySchema]) {
        if (schema) expectAccepted(schema, route.operation.bodyExample, route, 'body');
      }
      for (const [status, { schema, example }] of Object.entries(route.operation.answers)) {
        if (schema) expectAccepted(schema, example, route, status);
      }
    }
  });

  it('is served as OpenAPI 3.1 in which every reference leads somewhere', async () => {
    const { body, headers } = await site.browser().get('/api/openapi.json');

    expect(body).toEqual(JSON.parse(JSON.stringify(openApiDocument(site.routes.registered))));
    expect(body.openapi).toBe('3.1.0');
    expect(headers['etag']).toBeDefined();
    const operations = Object.values(body.paths as Record<string, object>).flatMap((item) =>
      Object.keys(item),
    );
    expect(operations.length).toBe(site.routes.registered.length);
    const references = [...JSON.stringify(body).matchAll(/"\$ref":"([^"]*)"/g)].map((match) => match[1]!);
    expect(references.length).toBeGreaterThan(5);
    for (const reference of new Set(references)) {
      const name = /^#\/components\/schemas\/(\w+)$/.exec(reference)?.[1];
      expect(body.components.schemas[name ?? ''])
        .withContext(reference)
        .toBeDefined();
    }
    expect(Object.keys(body.components.schemas).sort()).toEqual(['Design', 'Evaluation', 'Problem', 'Steel']);
  });

  it('tells people about every kind of problem, where its type leads to, without a script', async () => {
    const { text, headers } = await site.browser().get('/api/docs');

    expect(headers['content-type']).toContain('text/html');
    for (const code of Object.keys(PROBLEMS)) expect(text).withContext(code).toContain(`<dt id="${code}">`);
    for (const { path } of site.routes.registered) expect(text).withContext(path).toContain(path);
    expect(text).not.toMatch(/<script|<link|src=|https?:/);
  });
});

function expectAccepted(schema: z.ZodType, example: unknown, route: RegisteredRoute, place: string): void {
  const parsed = schema.safeParse(JSON.parse(JSON.stringify(example ?? null)));
  expect(parsed.error?.issues).withContext(`${route.method} ${route.path} ${place}`).toBeUndefined();
}
