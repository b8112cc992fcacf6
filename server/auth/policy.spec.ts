import type { Response } from 'supertest';
import { aDesign } from '../testing/designs.js';
import { expectProblem } from '../testing/problem-answers.js';
import { type Browser, PASSWORD, type TestSite, testSite } from '../testing/test-site.js';
import { type Method, POLICY, ruleOf } from './policy.js';
import { Routes } from '../http/routes.js';

const ROLES = ['nobody', 'other', 'owner'] as const;

/** What each route answers to whom, written out by hand; `:id` is the owner's design. */
const EXPECTED: Readonly<Record<string, readonly [nobody: number, other: number, owner: number]>> = {
  'GET /api/health': [200, 200, 200],
  'GET /api/health/live': [200, 200, 200],
  'GET /api/openapi.json': [200, 200, 200],
  'GET /api/docs': [200, 200, 200],
  'GET /api/steels': [200, 200, 200],
  'POST /api/evaluate': [200, 200, 200],
  'GET /api/auth/csrf': [200, 200, 200],
  'POST /api/auth/register': [201, 201, 201],
  'POST /api/auth/login': [200, 200, 200],
  'POST /api/auth/logout': [204, 204, 204],
  'GET /api/auth/me': [401, 200, 200],
  'GET /api/auth/session': [200, 200, 200],
  'GET /api/designs': [401, 200, 200],
  'POST /api/designs': [401, 201, 201],
  'GET /api/designs/:id': [401, 404, 200],
  'PUT /api/designs/:id': [401, 404, 200],
  'DELETE /api/designs/:id': [401, 404, 204],
  'POST /api/designs/:id/restore': [401, 404, 200],
  'GET /api/designs/:id/card.pdf': [401, 404, 200],
  'GET /api/designs/:id/cut-sheet.pdf': [401, 404, 200],
};

describe('the policy table', () => {
  let site: TestSite;
  const browsers = new Map<(typeof ROLES)[number], Browser>();

  beforeAll(async () => {
    site = await testSite();
    for (const name of ['Owner', 'Other', 'Someone']) await site.member(name);
  });

  afterAll(() => site.close());

  it('has a rule for every route that Express knows, and no rule without a route', () => {
    const known = site.routes.router.stack.flatMap(({ route }) => {
      if (!route) throw new Error('Something was added to the router beside its routes.');
      const methods = new Set(route.stack.map(({ method }) => method.toUpperCase()));
      return [...methods].map((method) => `${method} ${route.path}`);
    });

    expect(known.sort()).toEqual(Object.keys(POLICY).sort());
    expect(site.routes.registered.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(known);
  });

  it('lets no route into the program without a rule', () => {
    const routes = new Routes(() => []);
    const operation = { id: 'x', tag: 'x', summary: 'x', description: 'x', answers: {}, problems: [] };

    expect(() =>
      routes.add({ method: 'GET', path: '/api/unheard-of', operation, handle: () => ({ status: 204 }) }),
    ).toThrowError('The route GET /api/unheard-of has no rule in the policy table.');
    expect(() => ruleOf('DELETE', '/api/steels')).toThrowError(/no rule/);
  });

  it('is spelt out here for every route and everybody', () => {
    expect(Object.keys(EXPECTED).sort()).toEqual(Object.keys(POLICY).sort());
  });

  for (const [route, statuses] of Object.entries(EXPECTED)) {
    for (const [at, role] of ROLES.entries()) {
      it(`answers ${statuses[at]} to ${role} at ${route}`, async () => {
        const answer = await call(route, role, await ownersDesign());

        expect(answer.status).withContext(answer.text).toBe(statuses[at]!);
      });
    }
  }

  it('answers for someone else’s design exactly as for one that is not there', async () => {
    const design = await ownersDesign();
    const absent = {
      ...design,
      body: { ...design.body, id: 'b3c1f7d0-1111-4222-8333-444455556666' },
    } as Response;
    for (const route of Object.keys(POLICY).filter((key) => key.includes(':id'))) {
      const foreign = await call(route, 'other', design);
      const missing = await call(route, 'other', absent);
      expectProblem(foreign, 'not-found', route);
      expect({ ...foreign.body, instance: '' })
        .withContext(route)
        .toEqual({ ...missing.body, instance: '' });
      expect(Object.keys(foreign.headers).sort())
        .withContext(route)
        .toEqual(Object.keys(missing.headers).sort());
    }
    const owner = await as('owner');
    expect((await owner.get(`/api/designs/${design.body.id}`)).body).toEqual(design.body);
  });

  it('shows nobody a design of somebody else in a list', async () => {
    const design = await ownersDesign();
    const list = await (await as('other')).get('/api/designs');

    expect(list.text).not.toContain(design.body.id);
  });

  /** Signing in takes its time, so a browser is used until it has signed in or out. */
  async function as(role: (typeof ROLES)[number]): Promise<Browser> {
    const known = browsers.get(role);
    if (known) return known;
    const browser = site.browser();
    if (role !== 'nobody') await browser.signIn(role === 'owner' ? 'Owner' : 'Other');
    browsers.set(role, browser);
    return browser;
  }

  async function ownersDesign(): Promise<Response> {
    return (await as('owner')).send('POST', '/api/designs', { document: aDesign() });
  }

  async function call(route: string, role: (typeof ROLES)[number], design: Response): Promise<Response> {
    const [method = '', pattern = ''] = route.split(' ');
    const path = pattern.replace(':id', design.body.id as string);
    const browser = await as(role);
    if (path.startsWith('/api/auth/') && method === 'POST') browsers.delete(role);
    return browser.send(method as Method, path, bodyFor(route), {
      'If-Match': design.headers['etag'] as string,
    });
  }
});

let registered = 0;

function bodyFor(route: string): object | undefined {
  switch (route) {
    case 'POST /api/evaluate':
      return aDesign();
    case 'POST /api/auth/register':
      registered += 1;
      return { name: 'New', email: `new.${registered}@forge.example`, password: PASSWORD };
    case 'POST /api/auth/login':
      return { email: 'someone@forge.example', password: PASSWORD };
    case 'POST /api/designs':
    case 'PUT /api/designs/:id':
      return { document: aDesign() };
    default:
      return undefined;
  }
}
