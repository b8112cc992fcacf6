/** Builds what is stale: the pattern's kernel, then server and client side by side. Stale means: other contents, not newer dates. */
import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { endOnSignal, exists, node, root, stopWith, tool } from './command.mjs';
import { install } from './install.mjs';

const kernelFolder = 'shared/pattern/kernel';
const testCode = /\.spec\.ts$|\/testing\//;

const parts = {
  kernel: {
    sources: [kernelFolder],
    results: [],
    make: () => node([`${kernelFolder}/build.mjs`]),
  },
  server: {
    sources: ['server', 'shared', 'tsconfig.json', 'package-lock.json'],
    results: ['dist/server/server/main.js'],
    make: () => {
      rmSync(join(root, 'dist/server'), { recursive: true, force: true });
      return node([tool('typescript', 'tsc'), '-p', 'server/tsconfig.json', '--pretty', 'false']);
    },
  },
  client: {
    sources: ['src', 'shared', 'public', 'angular.json', 'tsconfig.json', 'package-lock.json'],
    results: ['dist/web/index.html'],
    make: () =>
      node([tool('@angular/cli', 'ng'), 'build', '--configuration=production', '--progress=false'], {
        env: { NG_CLI_ANALYTICS: 'false' },
      }),
  },
};

/** Builds the kernel (a generated source file) if there is one to build. Types and specs need it too. */
export async function buildKernel() {
  return exists(`${kernelFolder}/build.mjs`) ? buildPart('kernel') : { code: 0, output: '' };
}

/**
 * Builds whatever is stale.
 * @returns {Promise<{ code: number, output: string }>} output holds the reports of the parts that failed
 */
export async function build(say = () => {}) {
  const kernel = await buildKernel();
  if (kernel.code !== 0) return kernel;
  const results = await Promise.all([buildPart('server', say), buildPart('client', say)]);
  const failed = results.filter(({ code }) => code !== 0);
  return { code: failed.length === 0 ? 0 : 1, output: failed.map(({ output }) => output).join('\n') };
}

async function buildPart(name, say = () => {}) {
  const part = parts[name];
  const stampFile = join(root, 'dist', `.built-${name}`);
  const wanted = contentHash(part.sources);
  if (part.results.every(exists) && generatedIsThere(name) && readIfAny(stampFile) === wanted) {
    return { code: 0, output: '' };
  }
  say(`Building the ${name} …\n`);
  rmSync(stampFile, { force: true });
  const result = await part.make();
  if (result.code === 0) {
    mkdirSync(dirname(stampFile), { recursive: true });
    writeFileSync(stampFile, wanted);
  }
  return result;
}

function generatedIsThere(name) {
  return name !== 'kernel' || filesIn('shared/pattern').some((file) => file.endsWith('.generated.ts'));
}

/** One hash over the names and contents of all files that go into a part. */
function contentHash(sources) {
  const hash = createHash('sha256').update(process.version);
  for (const file of sources.flatMap(filesIn).sort()) {
    if (testCode.test(file) || file.endsWith('.generated.ts')) continue;
    hash.update(`\0${file}\0`).update(readFileSync(join(root, file)));
  }
  return hash.digest('hex');
}

function filesIn(path) {
  if (!exists(path)) return [];
  try {
    const entries = readdirSync(join(root, path), { withFileTypes: true });
    return entries.flatMap((entry) =>
      entry.isDirectory() ? filesIn(`${path}/${entry.name}`) : [`${path}/${entry.name}`],
    );
  } catch (error) {
    if (error.code === 'ENOTDIR') return [path];
    throw error;
  }
}

function readIfAny(file) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  endOnSignal();
  await install();
  const { code, output } = await build((line) => process.stdout.write(line));
  if (code !== 0) stopWith(`${output}\nThe build failed; see the lines above.`);
}
