import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { type Given, journey } from './harness/journey.js';
import { type View, desk, phone } from './harness/visitor.js';

/** A whole journey, on a machine that may be busy with the other tests. */
const PATIENCE_MS = 180_000;
const results = join(import.meta.dirname, '..', 'test-results');

/** Adds a step at the end of the plan and leaves it selected, its form open. */
async function addStep(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a step', exact: true }).click();
  await page.getByRole('menuitem', { name: new RegExp(`^${name}`) }).click();
  await page.getByRole('tab', { name: new RegExp(name) }).waitFor();
}

/** The button of the top bar; the notice about a removed step has one too. */
function undo(page: Page): ReturnType<Page['locator']> {
  return page.locator('lw-top-bar').getByRole('button', { name: 'Undo' });
}

/** Types into a field of the form and leaves it, as one does. */
async function enter(page: Page, label: string, text: string): Promise<void> {
  const field = page.getByRole('region', { name: 'Form' }).getByLabel(label, { exact: true });
  await field.fill(text);
  await field.press('Enter');
  await field.blur();
}

/** A figure of the line under the journey, as text. */
async function total(page: Page, label: string): Promise<string> {
  const figure = page.locator('lw-totals-line lw-figure').filter({ hasText: label });
  return (await figure.innerText()).replace(/\s+/g, ' ').trim();
}

/** Lays thirteen layers, plans weld, draw, restack by four and draw. */
async function planBillet(page: Page): Promise<void> {
  await page.goto('/draft');
  await page.getByRole('button', { name: 'Lay a stack' }).click();
  await page.getByText('13, the top one first').waitFor();
  await addStep(page, 'Forge weld');
  await addStep(page, 'Draw out');
  await enter(page, 'To length', '320');
  await enter(page, 'To thickness', '');
  await addStep(page, 'Restack');
  await enter(page, 'Pieces', '4');
  await addStep(page, 'Draw out');
  await enter(page, 'To thickness', '8');
}

async function signUp(page: Page, email: string): Promise<void> {
  await page.getByRole('link', { name: 'Sign up to keep it everywhere' }).click();
  await page.getByRole('heading', { name: 'Make an account' }).waitFor();
  await page.getByRole('textbox', { name: /^Name/ }).fill('Marit Solheim');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill('slow fire, long hammer');
  await page.getByRole('button', { name: 'Make the account' }).click();
  await page.waitForURL(/\/designs\/[\w-]+$/, { timeout: 60_000 });
}

function mainJob(given: Given, view: View): void {
  it(
    `from nothing to a printed card at ${view.width} px`,
    async () => {
      const visitor = await given.visitor(view);
      const { page } = visitor;
      await planBillet(page);

      expect(await total(page, 'Layers')).toContain('52');
      expect(await total(page, 'Welds')).toContain('1');
      const end = await total(page, 'End');
      expect(end).toMatch(/\d/);
      expect(await visitor.accessibilityViolations()).toEqual([]);
      expect(await visitor.sidewaysScrollPx()).toBe(0);
      await visitor.screenshot(`main-job-planned-${view.width}`, true);

      await signUp(page, `marit-${view.width}@forge.example`);
      await page
        .getByText(/^Saved/)
        .first()
        .waitFor();
      await page.reload();
      await page
        .getByText(/^Saved/)
        .first()
        .waitFor();
      expect(await total(page, 'End')).toBe(end);
      expect(await total(page, 'Layers')).toContain('52');

      const id = new URL(page.url()).pathname.split('/').pop() ?? '';
      for (const sheet of ['card', 'cut-sheet']) {
        const answer = await page.request.get(`/api/designs/${id}/${sheet}.pdf`, { timeout: 60_000 });
        expect(answer.status()).toBe(200);
        expect(answer.headers()['content-type']).toBe('application/pdf');
        const pdf = await answer.body();
        expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
        await mkdir(results, { recursive: true });
        await writeFile(join(results, `${sheet}-${view.width}.pdf`), pdf);
      }
    },
    PATIENCE_MS,
  );
}

journey('the main job', { SEED_DEMO: '0' }, (given) => {
  mainJob(given, desk);
  mainJob(given, phone);

  it(
    'survives a mistake: undo, redo and a reload of the visitor’s draft',
    async () => {
      const visitor = await given.visitor(desk);
      const { page } = visitor;
      await planBillet(page);
      const end = await total(page, 'End');
      await page.getByRole('button', { name: 'Remove the step' }).click();
      expect(await total(page, 'End')).not.toBe(end);
      await undo(page).click();
      expect(await total(page, 'End')).toBe(end);
      await page.waitForTimeout(2_000);
      await page.reload();
      await undo(page).waitFor();
      expect(await total(page, 'End')).toBe(end);
      await page.getByRole('button', { name: 'Redo' }).click();
      expect(await total(page, 'End')).not.toBe(end);
    },
    PATIENCE_MS,
  );

  it(
    'refuses a step that can’t be, with both numbers, and keeps what was before it',
    async () => {
      const visitor = await given.visitor(desk);
      const { page } = visitor;
      await planBillet(page);
      await addStep(page, 'Trim the ends');
      await enter(page, 'Off each end', '900');
      const refusal = page.getByRole('region', { name: 'Form' }).getByRole('alert');
      await refusal.waitFor();
      expect(await refusal.innerText()).toMatch(/1800 mm/);
      await page.getByText('No result.').waitFor();
      await visitor.screenshot('main-job-refused');
    },
    PATIENCE_MS,
  );
});

journey('the demo shop', { SEED_DEMO: '1' }, (given) => {
  for (const theme of ['light', 'dark'] as const) {
    for (const view of [desk, phone]) {
      it(
        `shows its bench and a design at ${view.width} px, ${theme}`,
        async () => {
          const visitor = await given.visitor({ ...view, theme });
          const { page } = visitor;
          for (const path of ['/account/sign-up', '/account/sign-in']) {
            await page.goto(path);
            await page.getByRole('heading', { level: 1 }).waitFor();
            expect(await visitor.accessibilityViolations()).toEqual([]);
            expect(await visitor.sidewaysScrollPx()).toBe(0);
            await visitor.screenshot(`${path.split('/').pop() ?? ''}-${view.width}-${theme}`);
          }
          await page.getByLabel('E-mail address').fill('smith@two-rivers.example');
          await page.getByLabel('Password', { exact: true }).fill('borax-and-flux');
          await page.getByRole('button', { name: 'Sign in', exact: true }).click();
          await page
            .getByRole('link', { name: /Kitchen knife, ladder/ })
            .first()
            .waitFor();
          expect(await visitor.accessibilityViolations()).toEqual([]);
          expect(await visitor.sidewaysScrollPx()).toBe(0);
          await visitor.screenshot(`bench-${view.width}-${theme}`, true);
          await page
            .getByRole('link', { name: /Kitchen knife, ladder/ })
            .first()
            .click();
          await page.waitForURL(/\/designs\//);
          await page
            .getByRole('button', { name: /Groove/ })
            .first()
            .click();
          await page.getByRole('tab', { name: /Groove/ }).waitFor();
          expect(await visitor.accessibilityViolations()).toEqual([]);
          expect(await visitor.sidewaysScrollPx()).toBe(0);
          await visitor.screenshot(`editor-${view.width}-${theme}`, true);
        },
        PATIENCE_MS,
      );
    }
  }
});
