/** Runs the project's tools as children: found without npx, captured or shown, and ended with us. */
import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder, wherever the command was given. */
export const root = dirname(dirname(fileURLToPath(import.meta.url)));
process.chdir(root);

const children = new Set();

/** Arguments for `node` that start the command `command` of an installed package. */
export function tool(packageName, command = packageName) {
  const folder = join(root, 'node_modules', packageName);
  const { bin } = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8'));
  return join(folder, typeof bin === 'string' ? bin : bin[command]);
}

/**
 * Runs `node` with these arguments and collects what it prints.
 * @returns {Promise<{ code: number, output: string }>}
 */
export function node(args, options = {}) {
  return run(process.execPath, args, options);
}

/** The longest that anything here may take, ms; what takes longer hangs. */
const patienceMs = 30 * 60_000;

/**
 * Runs a program to its end and collects what it prints.
 * @returns {Promise<{ code: number, output: string }>}
 */
export function run(program, args, { env = {}, cwd = root } = {}) {
  return new Promise((resolve) => {
    const child = start(program, args, { env, cwd, stdio: ['ignore', 'pipe', 'pipe'] });
    const parts = [];
    child.stdout.on('data', (part) => parts.push(part));
    child.stderr.on('data', (part) => parts.push(part));
    const timer = setTimeout(() => child.kill('SIGKILL'), patienceMs);
    child.on('close', () => clearTimeout(timer));
    child.on('error', (error) =>
      resolve({ code: 1, output: `${program} could not be started: ${error.message}\n` }),
    );
    child.on('close', (code, signal) => {
      const output = Buffer.concat(parts).toString('utf8');
      resolve({ code: code ?? 1, output: signal ? `${output}${program} was ended by ${signal}\n` : output });
    });
  });
}

/** Starts a program and leaves it running; it is ended when this process ends. */
export function start(program, args, { env = {}, cwd = root, stdio = 'inherit' } = {}) {
  const child = spawn(program, args, { cwd, stdio, env: { ...process.env, ...env } });
  children.add(child);
  child.on('close', () => children.delete(child));
  return child;
}

/** Ends what was started and is still running. */
export function endChildren(signal = 'SIGTERM') {
  for (const child of children) child.kill(signal);
}

process.on('exit', () => endChildren());

/**
 * Turns Ctrl+C and a polite kill into an orderly end, children first.
 * @returns {() => void} takes that back
 */
export function endOnSignal() {
  const codes = { SIGINT: 130, SIGTERM: 143, SIGHUP: 129 };
  const listeners = Object.entries(codes).map(([signal, code]) => {
    const end = () => {
      endChildren();
      process.exit(code);
    };
    process.on(signal, end);
    return () => process.off(signal, end);
  });
  return () => listeners.forEach((remove) => remove());
}

/**
 * Ends this process when npm is ended. npm hands a signal to the shell that it started us with, and that shell keeps it
 * to itself: without this a server would stay behind, holding the port and the data folder.
 */
export function endWithNpm() {
  const { ppid } = process;
  if (process.env.npm_lifecycle_event === undefined || ppid === 1) return;
  setInterval(() => {
    if (process.ppid !== ppid) process.kill(process.pid, 'SIGTERM');
  }, 500).unref();
}

/** Ends the process with a message for whoever gave the command. */
export function stopWith(message) {
  process.stderr.write(`\n${message.trimEnd()}\n`);
  process.exit(1);
}

/** True if the path, given from the project's folder, exists. */
export function exists(path) {
  return existsSync(join(root, path));
}
