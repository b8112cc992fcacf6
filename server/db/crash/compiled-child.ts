import { mkdir, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { dirname, join, relative, resolve } from 'node:path';
import ts from 'typescript';

const ROOT = resolve(import.meta.dirname, '..', '..', '..');
const CHILD = join(import.meta.dirname, 'child.ts');

const OPTIONS: ts.CompilerOptions = {
  module: ts.ModuleKind.ESNext,
  target: ts.ScriptTarget.ES2022,
  experimentalDecorators: true,
  useDefineForClassFields: false,
};

/** The script of the process that is killed, as JavaScript. */
export interface CompiledChild {
  readonly script: string;
  readonly remove: () => Promise<void>;
}

/**
 * Compiles the child and every source that it imports, without checking types: hundreds of processes that each compile
 * them for themselves would spend their time on that.
 */
export async function compileChild(): Promise<CompiledChild> {
  const dist = join(ROOT, 'dist');
  await mkdir(dist, { recursive: true });
  // Within the project, so that packages and the kind of module are found as for the sources.
  const folder = await mkdtemp(join(dist, 'crash-'));
  const outputOf = (source: string): string => join(folder, relative(ROOT, source).replace(/\.ts$/, '.js'));
  const seen = new Set([CHILD]);
  for (const source of seen) {
    const text = await readFile(source, 'utf8');
    for (const { fileName } of ts.preProcessFile(text).importedFiles) {
      if (fileName.startsWith('.')) seen.add(resolve(dirname(source), fileName.replace(/\.js$/, '.ts')));
    }
    const output = outputOf(source);
    await mkdir(dirname(output), { recursive: true });
    await writeFile(
      output,
      ts.transpileModule(text, { compilerOptions: OPTIONS, fileName: source }).outputText,
    );
  }
  return { script: outputOf(CHILD), remove: () => rm(folder, { recursive: true, force: true }) };
}
