/** Compiles the kernel and writes it as a source file, so that it is bundled like any other and nothing has to be fetched. */
import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import asc from 'assemblyscript/asc';

const folder = dirname(fileURLToPath(import.meta.url));
const files = new Map();

const { error, stderr } = await asc.main(
  [
    join(folder, 'assembly/index.ts'),
    '--enable',
    'simd',
    '--runtime',
    'stub',
    '--noAssert',
    '--use',
    'abort=',
    '--optimizeLevel',
    '3',
    '--shrinkLevel',
    '0',
    '--converge',
    '--initialMemory',
    '1',
    '--outFile',
    'kernel.wasm',
  ],
  {
    writeFile: (name, contents) => void files.set(name, contents),
  },
);
const wasm = files.get('kernel.wasm');
if (error !== null || wasm === undefined) {
  console.error(stderr.toString());
  console.error(error?.message ?? 'The compiler wrote no kernel.');
  process.exit(1);
}

const base64 = Buffer.from(wasm).toString('base64');
const lines = base64.match(/.{1,100}/g).map((line) => `  '${line}',`);
writeFileSync(
  join(folder, 'kernel.generated.ts'),
  [
    '// Made by build.mjs from the sources in assembly/. Not in git: change those instead.',
    '',
    `/** The kernel, ${wasm.length} bytes of WebAssembly, in base64. */`,
    'export const KERNEL_BASE64: string = [',
    ...lines,
    "].join('');",
    '',
  ].join('\n'),
);
console.log(`kernel: ${wasm.length} bytes`);
