import { mkdir } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import {
  chromium,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  type Page,
} from 'playwright-core';
import { accessibilityViolations } from './accessibility.js';

const results = join(import.meta.dirname, '..', '..', 'test-results');

/** As root in a container; and without the services of a desktop browser that look for a network. */
const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Starts Chromium: the one that CHROME_BIN names, or Debian's. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({ executablePath: process.env['CHROME_BIN'] ?? '/usr/bin/chromium', args: flags });
}

/** How a visitor looks at the page. */
export interface View {
  readonly width: number;
  readonly height: number;
  readonly theme: 'light' | 'dark';
  /** A finger instead of a mouse. */
  readonly touch: boolean;
  /** Decides on millimetres or inches until the visitor chooses. */
  readonly locale: string;
}

/** The widths at which every page has to work. */
export const desk: View = { width: 1440, height: 900, theme: 'light', touch: false, locale: 'en-GB' };
export const tablet: View = { ...desk, width: 820, height: 1180, touch: true };
export const phone: View = { ...desk, width: 390, height: 844, touch: true };

/** One person in a browser of their own: no cookies, nothing stored. What goes wrong in the page is noted. */
export class Visitor {
  private readonly problems: string[] = [];
  private readonly expected: RegExp[] = [];

  private constructor(
    readonly context: BrowserContext,
    readonly page: Page,
  ) {}

  /** Opens a context on `baseUrl`. */
  static async open(browser: Browser, baseUrl: string, view: Partial<View> = {}): Promise<Visitor> {
    const { width, height, theme, touch, locale } = { ...desk, ...view };
    const options: BrowserContextOptions = {
      baseURL: baseUrl,
      viewport: { width, height },
      colorScheme: theme,
      hasTouch: touch,
      reducedMotion: 'reduce',
      locale,
      timezoneId: 'UTC',
    };
    const context = await browser.newContext(options);
    context.setDefaultTimeout(60_000);
    const visitor = new Visitor(context, await context.newPage());
    context.on('console', (message) => {
      if (message.type() === 'error') visitor.note(`${message.text()} (${message.location().url})`);
    });
    context.on('weberror', (error) => visitor.note(error.error().message));
    return visitor;
  }

  /** Errors of the page that a journey brings about on purpose, a refused sign-in say. */
  expectProblem(pattern: RegExp): void {
    this.expected.push(pattern);
  }

  /** Console errors, uncaught exceptions and blocked resources so far, less the expected ones. */
  get unexpectedProblems(): readonly string[] {
    return this.problems.filter((problem) => !this.expected.some((pattern) => pattern.test(problem)));
  }

  /** What axe finds on the page as it is: one line for each, none if all is well. */
  accessibilityViolations(): Promise<readonly string[]> {
    return accessibilityViolations(this.page);
  }

  /** How far the page can be pushed sideways, CSS px; 0 when it fits. */
  sidewaysScrollPx(): Promise<number> {
    return this.page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
  }

  /** Keeps a picture of the page as `test-results/<name>.png`. */
  async screenshot(name: string, fullPage = false): Promise<void> {
    const path = join(results, `${name}.png`);
    await mkdir(dirname(path), { recursive: true });
    await this.page.screenshot({ path, fullPage, animations: 'disabled' });
  }

  close(): Promise<void> {
    return this.context.close();
  }

  private note(problem: string): void {
    this.problems.push(problem);
  }
}
