/** The stages of `npm run check` and `npm test`, and the runner that works them off two at a time. */
import { build, buildKernel } from './build.mjs';
import { node, tool } from './command.mjs';

/**
 * @typedef {object} Stage
 * @property {string} name
 * @property {() => Promise<{ code: number, output: string }>} run
 * @property {boolean} [specs] it prints how many specs passed and failed
 * @property {string} [after] the stage that has to pass first
 */

const typeCheck = (name, project) => ({
  name: `types: ${name}`,
  run: () => node([tool('typescript', 'tsc'), '-p', project, '--noEmit', '--pretty', 'false']),
});

/** The Angular compiler, so that templates are checked as well. */
const templateCheck = (name, project) => ({
  name: `types: ${name}`,
  run: () => node([tool('@angular/compiler-cli', 'ngc'), '-p', project, '--noEmit']),
});

/** In two halves, since each reads the types of its part. */
const lint = (name, ...paths) => ({
  name: `lint: ${name}`,
  run: () => node([tool('eslint'), '--max-warnings', '0', ...paths]),
});

const jasmine = (name, folder, tsConfig, after) => ({
  name,
  specs: true,
  after,
  run: () =>
    node(
      ['--import', 'tsx', tool('jasmine'), `--config=${folder}/jasmine.json`, '--helper=.ci/patience.mjs'],
      {
        env: { TSX_TSCONFIG_PATH: tsConfig, NODE_ENV: 'test', FORCE_COLOR: '0', NO_COLOR: '1' },
      },
    ),
});

/** What is quick and needs no browser: the whole of `npm run check`. */
export const quickStages = [
  { name: 'format', run: () => node([tool('prettier'), '--check', '--log-level', 'warn', '.']) },
  { name: 'kernel', run: buildKernel },
  { name: 'import rules', specs: true, after: 'kernel', run: () => node(['.ci/import-rules.mjs']) },
  ...[
    lint('the trade', 'shared'),
    lint('all else', '.', '--ignore-pattern', 'shared/'),
    typeCheck('shared', 'shared/tsconfig.json'),
    typeCheck('shared specs', 'shared/tsconfig.spec.json'),
    typeCheck('server', 'server/tsconfig.json'),
    typeCheck('server specs', 'server/tsconfig.spec.json'),
    templateCheck('client', 'src/tsconfig.app.json'),
    templateCheck('client specs', 'src/tsconfig.spec.json'),
    typeCheck('worker', 'src/tsconfig.worker.json'),
    typeCheck('journeys', 'e2e/tsconfig.json'),
  ].map((stage) => ({ ...stage, after: 'kernel' })),
  jasmine('shared specs in Node', 'shared', 'shared/tsconfig.spec.json', 'kernel'),
  jasmine('server specs', 'server', 'server/tsconfig.spec.json', 'kernel'),
];

const isKernel = ({ name }) => name === 'kernel';
const isSpecs = ({ name }) => name.includes('specs in Node') || name === 'server specs';

/** Everything. What takes longest starts first. */
export const fullStages = [
  ...quickStages.filter(isKernel),
  { name: 'build', after: 'kernel', run: () => build() },
  ...quickStages.filter(isSpecs).reverse(),
  {
    name: 'client and shared specs in Chromium',
    specs: true,
    after: 'kernel',
    run: () =>
      node([tool('@angular/cli', 'ng'), 'test', '--watch=false', '--progress=false', '--reporters=dots'], {
        env: { NG_CLI_ANALYTICS: 'false' },
      }),
  },
  jasmine('journeys in Chromium', 'e2e', 'e2e/tsconfig.json', 'build'),
  ...quickStages.filter((stage) => !isKernel(stage) && !isSpecs(stage)),
];

/**
 * Runs the stages, two at a time, in their order; prints a line for each, and what a failed one had to say.
 * Ends with `N passed, N failed`: specs where a stage has them, else one for the stage.
 * @returns {Promise<boolean>} true if all passed
 */
export async function runStages(stages, parallel = 2) {
  const waiting = stages.map((stage) => ({ ...stage }));
  const running = new Set();
  const results = new Map();
  const width = Math.max(...stages.map(({ name }) => name.length));

  const isReady = ({ after }) =>
    after === undefined || results.has(after) || !stages.some(({ name }) => name === after);
  const settle = (stage, result) => {
    results.set(stage.name, result);
    const { passed, failed, seconds, note } = result;
    const counts = stage.specs ? `${passed} passed, ${failed} failed` : '';
    const mark = failed === 0 ? 'ok  ' : 'FAIL';
    console.log(
      `${mark} ${stage.name.padEnd(width)} ${seconds.toFixed(1).padStart(6)} s  ${note ?? counts}`.trimEnd(),
    );
    if (failed > 0 && result.output.trim() !== '') console.log(`\n${result.output.trimEnd()}\n`);
  };

  while (waiting.length > 0 || running.size > 0) {
    let next;
    while (running.size < parallel && (next = waiting.findIndex(isReady)) >= 0) {
      const [stage] = waiting.splice(next, 1);
      if (stage.after !== undefined && results.get(stage.after)?.failed > 0) {
        settle(stage, {
          passed: 0,
          failed: 1,
          seconds: 0,
          output: '',
          note: `not run: ${stage.after} failed`,
        });
        continue;
      }
      const job = timed(stage).then((result) => {
        running.delete(job);
        settle(stage, result);
      });
      running.add(job);
    }
    if (running.size > 0) await Promise.race(running);
  }

  const sum = (key) => [...results.values()].reduce((total, result) => total + result[key], 0);
  console.log(`\n${sum('passed')} passed, ${sum('failed')} failed`);
  return sum('failed') === 0;
}

async function timed(stage) {
  const start = performance.now();
  const { code, output } = await stage.run().catch((error) => ({ code: 1, output: String(error.stack) }));
  const seconds = (performance.now() - start) / 1000;
  const good = code === 0;
  if (!stage.specs) return { passed: good ? 1 : 0, failed: good ? 0 : 1, seconds, output };
  const { passed, failed } = specCounts(output);
  // A run that found no spec, or broke outside of one, has failed whatever its counts say.
  return { passed, failed: failed === 0 && (!good || passed === 0) ? 1 : failed, seconds, output };
}

/** Reads the last counts that Jasmine or Karma printed. A spec that was skipped counts as failed. */
export function specCounts(output) {
  const plain = output.replace(/\u001b\[[0-9;]*[A-Za-z]/g, '');
  const jasmineLine = [...plain.matchAll(/(\d+) specs?, (\d+) failures?(?:, (\d+) pending specs?)?/g)].at(-1);
  if (jasmineLine) {
    const [all, failures, pending] = jasmineLine.slice(1).map((count) => Number(count ?? 0));
    return { passed: all - failures - pending, failed: failures + pending };
  }
  const karmaLine = [...plain.matchAll(/Executed (\d+) of (\d+)[^\r\n]*/g)].at(-1);
  if (!karmaLine) return { passed: 0, failed: 0 };
  const [line, executed, all] = karmaLine;
  const failures = Number(/\((\d+) FAILED\)/.exec(line)?.[1] ?? 0);
  return { passed: Number(executed) - failures, failed: failures + Number(all) - Number(executed) };
}
