import { type Browser } from 'playwright-core';
import { BuiltApp } from './built-app.js';
import { launchChromium, Visitor, type View } from './visitor.js';

/** What a journey sets out with. */
export interface Given {
  /** The running application. */
  readonly app: BuiltApp;
  /** A new person at the door, in a browser without cookies. Closed by itself when the spec ends. */
  visitor(view?: Partial<View>): Promise<Visitor>;
}

/**
 * A `describe` with the built application and a browser. A spec fails on any error in a page that it did not
 * announce, and leaves a picture of every page that was open when it ended.
 * @param env settings of the server, `{ SEED_DEMO: '1' }` for the demo shop
 */
export function journey(name: string, env: NodeJS.ProcessEnv, body: (given: Given) => void): void {
  describe(name, () => {
    let app: BuiltApp | undefined;
    let browser: Browser | undefined;
    let visitors: Visitor[] = [];

    const given: Given = {
      get app() {
        if (app === undefined) throw new Error('The application runs inside of specs only');
        return app;
      },
      async visitor(view) {
        if (browser === undefined) throw new Error('The browser runs inside of specs only');
        const visitor = await Visitor.open(browser, given.app.url, view);
        visitors.push(visitor);
        return visitor;
      },
    };

    beforeAll(async () => {
      [app, browser] = await Promise.all([BuiltApp.start(env), launchChromium()]);
    }, 180_000);

    afterEach(async () => {
      const open = visitors;
      visitors = [];
      for (const [index, visitor] of open.entries()) {
        expect(visitor.unexpectedProblems).withContext('errors in the page').toEqual([]);
        await visitor.screenshot(`ended/${fileName(currentSpec)}-${index + 1}`);
        await visitor.close();
      }
    }, 180_000);

    afterAll(async () => {
      await browser?.close();
      await app?.stop();
    }, 180_000);

    body(given);
  });
}

let currentSpec = '';

jasmine.getEnv().addReporter({
  specStarted: ({ fullName }) => {
    currentSpec = fullName;
  },
});

function fileName(text: string): string {
  return text.toLowerCase().replace(/[^a-z0-9]+/g, '-');
}
