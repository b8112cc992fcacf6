import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { type Page } from 'playwright-core';

interface AxeViolation {
  readonly id: string;
  readonly help: string;
  readonly nodes: readonly { readonly target: readonly unknown[]; readonly failureSummary?: string }[];
}

const source = readFile(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/**
 * Runs axe on the page: WCAG 2.2 A and AA, and its best practices.
 * The source is evaluated, since the content security policy lets no foreign script tag in.
 */
export async function accessibilityViolations(page: Page): Promise<readonly string[]> {
  if (!(await page.evaluate(() => 'axe' in window))) await page.evaluate(await source);
  const violations = await page.evaluate(async (): Promise<AxeViolation[]> => {
    const { axe } = window as unknown as {
      axe: { run(context: Document, options: object): Promise<{ violations: AxeViolation[] }> };
    };
    const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];
    const result = await axe.run(document, { runOnly: { type: 'tag', values: tags } });
    return result.violations;
  });
  return violations.flatMap(({ id, help, nodes }) =>
    nodes.map((node) => `${id}: ${help}: ${node.target.join(' ')}: ${node.failureSummary ?? ''}`),
  );
}
