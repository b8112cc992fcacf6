import { CATALOGUE } from '../../shared/steels/index.js';
import { testSite } from '../testing/test-site.js';

describe('the catalogue', () => {
  it('is given as it is, and not again to whoever has it', async () => {
    const site = await testSite();
    const answer = await site.browser().get('/api/steels');

    expect(answer.headers['content-type']).toBe('application/json; charset=utf-8');
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(CATALOGUE)));
    for (const { id, densityKgM3 } of answer.body as { id: string; densityKgM3: number }[]) {
      expect(densityKgM3).withContext(id).toBeGreaterThan(1000);
    }

    const again = await site
      .browser()
      .get('/api/steels', { 'If-None-Match': answer.headers['etag'] as string });
    expect([again.status, again.text]).toEqual([304, '']);
    await site.close();
  });
});
