import { type TestSite, testSite } from '../testing/test-site.js';
import { DEMO_DESIGNS } from './designs.js';
import { DEMO_PEOPLE, DEMO_SHOP } from './people.js';

describe('the demonstration', () => {
  let site: TestSite;

  beforeAll(async () => {
    site = await testSite();
    await site.seed();
  });

  afterAll(() => site.close());

  it('is one shop with an owner, a smith and a student, each of whom can sign in and has designs', async () => {
    let designs = 0;
    for (const { role, email, password, name } of DEMO_PEOPLE) {
      const browser = site.browser();
      const answer = await browser.send('POST', '/api/auth/login', { email, password });
      expect(answer.status).withContext(role).toBe(200);
      expect(answer.body.account.name).withContext(role).toBe(name);
      expect(answer.body.shops)
        .withContext(role)
        .toEqual([{ id: jasmine.any(String), name: DEMO_SHOP, role }]);
      designs += (await browser.get('/api/designs')).body.length as number;
    }
    expect(DEMO_PEOPLE.map(({ role }) => role)).toEqual(['owner', 'smith', 'student']);
    expect(designs).toBe(5);
    expect(DEMO_DESIGNS.length).toBe(5);
  });

  it('holds designs that can be forged', async () => {
    for (const { design } of DEMO_DESIGNS) {
      const answer = await site.browser().raw('POST', '/api/evaluate', design);
      expect(answer.status).withContext(design.name).toBe(200);
    }
  });
});
