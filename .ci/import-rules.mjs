/**
 * Holds the import rules of dependency-rules.cjs, then proves that they bite: forbidden imports are planted in a
 * copy of the sources, one for every arrow that matters, and each has to be reported.
 */
import {
  cpSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  realpathSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { endOnSignal, node, root, stopWith, tool } from './command.mjs';

const houses = ['src', 'server', 'shared', 'e2e'];

/** A file to plant, what it imports, and the rule that has to name it (or none, as the control). */
const plants = [
  { file: 'shared/bar/planted-control.ts', imports: '../units/index.js', rule: null },
  { file: 'src/app/bench/planted-control.ts', imports: '@shared/bar', rule: null },
  { file: 'src/app/editor/canvas/planted-control.ts', imports: 'konva', rule: null },
  { file: 'server/planted-control.ts', imports: 'express', rule: null },
  {
    file: 'shared/units/planted-server.ts',
    imports: '../../server/planted-target.js',
    rule: 'shared-knows-no-house',
  },
  {
    file: 'shared/units/planted-client.ts',
    imports: '../../src/app/rack/planted-target.js',
    rule: 'shared-knows-no-house',
  },
  { file: 'shared/units/planted-upward.ts', imports: '../bar/index.js', rule: 'not-in-allowed' },
  { file: 'shared/steps/planted-sideways.ts', imports: '../design/index.js', rule: 'not-in-allowed' },
  { file: 'shared/steps/planted-deep.ts', imports: '../bar/planted-target.js', rule: 'not-in-allowed' },
  {
    file: 'shared/bar/planted-type.ts',
    imports: '../design/index.js',
    typeOnly: true,
    rule: 'not-in-allowed',
  },
  { file: 'shared/bar/planted-package.ts', imports: 'zod', rule: 'not-in-allowed' },
  { file: 'shared/bar/planted-node.ts', imports: 'node:fs', rule: 'not-in-allowed' },
  {
    file: 'shared/bar/planted-spec-import.ts',
    imports: './planted-target.spec.js',
    rule: 'no-test-code-in-the-product',
  },
  {
    file: 'server/planted-client.ts',
    imports: '../src/app/rack/planted-target.js',
    rule: 'server-never-client',
  },
  { file: 'server/planted-deep.ts', imports: '../shared/bar/planted-target.js', rule: 'shared-index-only' },
  { file: 'server/planted-dev-package.ts', imports: 'supertest', rule: 'not-in-allowed' },
  {
    file: 'src/app/bench/planted-server.ts',
    imports: '../../../server/planted-target.js',
    rule: 'client-never-server',
  },
  { file: 'src/app/bench/planted-feature.ts', imports: '../rack/planted-target', rule: 'features-apart' },
  { file: 'src/app/bench/planted-deep.ts', imports: '@shared/bar/planted-target', rule: 'shared-index-only' },
  { file: 'src/app/bench/planted-konva.ts', imports: 'konva', rule: 'konva-in-the-canvas' },
  { file: 'src/app/editor/planted-konva.ts', imports: 'konva', rule: 'konva-in-the-canvas' },
  { file: 'src/app/core/planted-feature.ts', imports: '../rack/planted-target', rule: 'not-in-allowed' },
  { file: 'src/app/ui/planted-core.ts', imports: '../core/planted-target', rule: 'not-in-allowed' },
  { file: 'src/app/bench/planted-package.ts', imports: 'express', rule: 'not-in-allowed' },
  { file: 'shared/units/planted-cycle.ts', imports: './planted-cycle-back.js', rule: 'no-cycle' },
  { file: 'shared/units/planted-nowhere.ts', imports: './planted-nothing.js', rule: 'resolvable' },
];
const plain = 'export const planted = 1;\n';
const targets = {
  'server/planted-target.ts': plain,
  'src/app/rack/planted-target.ts': plain,
  'src/app/core/planted-target.ts': plain,
  'shared/bar/planted-target.ts': plain,
  'shared/bar/planted-target.spec.ts': plain,
  'shared/units/planted-cycle-back.ts': "export * from './planted-cycle.js';\n",
};

/** What dependency-cruiser finds wrong in a folder laid out like the project: `{ from, to, rule }` each. */
async function violationsIn(folder) {
  const present = houses.filter((house) => existsSync(join(folder, house)));
  const { code, output } = await node(
    [
      tool('dependency-cruiser', 'depcruise'),
      '--config',
      '.ci/dependency-rules.cjs',
      '--output-type',
      'json',
      ...present,
    ],
    { cwd: folder },
  );
  let summary;
  try {
    ({ summary } = JSON.parse(output));
  } catch {
    stopWith(`${output}\ndependency-cruiser ended with ${code} and no report.`);
  }
  return {
    violations: summary.violations.map(({ from, to, rule }) => ({ from, to, rule: rule.name })),
    modules: summary.totalCruised,
  };
}

function plantIn(folder) {
  for (const house of houses.filter((name) => existsSync(join(root, name)))) {
    cpSync(join(root, house), join(folder, house), { recursive: true });
  }
  for (const file of ['.ci/dependency-rules.cjs', 'package.json', 'tsconfig.json']) {
    mkdirSync(dirname(join(folder, file)), { recursive: true });
    cpSync(join(root, file), join(folder, file));
  }
  symlinkSync(join(root, 'node_modules'), join(folder, 'node_modules'), 'junction');
  const write = (file, text) => {
    mkdirSync(dirname(join(folder, file)), { recursive: true });
    writeFileSync(join(folder, file), text);
  };
  for (const [file, text] of Object.entries(targets)) write(file, text);
  for (const { file, imports, typeOnly } of plants) {
    write(file, typeOnly ? `export type * from '${imports}';\n` : `export * from '${imports}';\n`);
  }
}

endOnSignal();

const real = await violationsIn(root);
for (const { from, to, rule } of real.violations) console.log(`  ${rule}: ${from} → ${to}`);
console.log(`${real.modules} modules, ${real.violations.length} forbidden imports`);

const folder = realpathSync(mkdtempSync(join(tmpdir(), 'layerwright-import-rules-')));
let missed;
try {
  plantIn(folder);
  const { violations } = await violationsIn(folder);
  missed = plants.filter(({ file, rule }) => {
    // By the start of the name: a cycle is reported once, at either of its files.
    const name = file.replace(/\.ts$/, '');
    const rules = violations.filter(({ from }) => from.startsWith(name)).map((violation) => violation.rule);
    return rule === null ? rules.length > 0 : !rules.includes(rule);
  });
} finally {
  rmSync(folder, { recursive: true, force: true });
}
for (const { file, imports, rule } of missed) {
  console.log(
    rule === null
      ? `  wrongly refused: ${file} → ${imports}`
      : `  not reported: ${file} → ${imports} (${rule})`,
  );
}
const bitten = plants.length - missed.length;
console.log(
  `${plants.length} specs, ${missed.length} failures (planted imports judged as they should be: ${bitten})`,
);
if (real.violations.length + missed.length > 0) process.exit(1);
