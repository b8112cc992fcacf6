import { desk, phone } from './harness/visitor.js';
import { journey } from './harness/journey.js';

journey('the front door', {}, (given) => {
  it('answers health and sends a strict content security policy', async () => {
    const health = await fetch(`${given.app.url}/api/health`);
    expect(health.status).toBe(200);
    const page = await fetch(given.app.url);
    expect(page.status).toBe(200);
    const policy = page.headers.get('content-security-policy') ?? '';
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("object-src 'none'");
    expect(/script-src [^;]*/.exec(policy)?.[0]).not.toContain('unsafe-inline');
  });

  for (const view of [desk, phone]) {
    for (const theme of ['light', 'dark'] as const) {
      it(`opens at ${view.width} px, ${theme}`, async () => {
        const visitor = await given.visitor({ ...view, theme });
        await visitor.page.goto('/');
        await visitor.page.getByRole('main').waitFor();
        await visitor.page.getByRole('heading', { level: 1 }).first().waitFor();
        expect(await visitor.page.title()).toContain('Layerwright');
        expect(await visitor.sidewaysScrollPx()).toBe(0);
        expect(await visitor.accessibilityViolations()).toEqual([]);
        await visitor.screenshot(`front-door-${view.width}-${theme}`);
      }, 180_000);
    }
  }

  it('answers an unknown address under /api with a problem document', async () => {
    const answer = await fetch(`${given.app.url}/api/no-such-thing`);
    expect(answer.status).toBe(404);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
  });
});
