/** Brings node_modules to what package-lock.json says, and does nothing (no npm, no network) when it is there. */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { root, run, stopWith } from './command.mjs';

const lockFile = join(root, 'package-lock.json');
const stampFile = join(root, 'node_modules', '.layerwright-lock');
const neededNode = [20, 19];

/** Installs the packages if that is needed. Ends the process with a clear message if it can't be done. */
export async function install() {
  checkNode();
  const wanted = createHash('sha256').update(readFileSync(lockFile)).digest('hex');
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8').trim() === wanted) return;
  if (!installedByHand()) {
    process.stdout.write('Installing packages (once, about a minute) …\n');
    // Without install scripts: nothing here needs one, and some only report home.
    const args = ['ci', '--include=dev', '--include=optional', '--ignore-scripts', '--no-audit', '--no-fund'];
    const npm = npmCommand();
    const { code, output } = await run(npm[0], [...npm.slice(1), ...args, '--loglevel=error'], {
      env: { npm_config_update_notifier: 'false' },
    });
    if (code !== 0) {
      stopWith(
        `${output}\nThe packages could not be installed. This needs the npm registry the first time ` +
          '(and after package-lock.json has changed); see the lines above.',
      );
    }
  }
  writeFileSync(stampFile, `${wanted}\n`);
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > neededNode[0] || (major === neededNode[0] && minor >= neededNode[1])) return;
  stopWith(`Layerwright needs Node.js ${neededNode.join('.')} or newer; this is ${process.versions.node}.`);
}

/** npm started the way we were, so that a PATH without npm (or Windows' npm.cmd) is no obstacle. */
function npmCommand() {
  const { npm_execpath: script } = process.env;
  return script?.endsWith('.js') ? [process.execPath, script] : ['npm'];
}

/** True if what lies in node_modules is already what the lock file names, by npm's own record of what it put there. */
function installedByHand() {
  const recordFile = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(recordFile)) return false;
  const here = JSON.parse(readFileSync(recordFile, 'utf8')).packages;
  const wanted = JSON.parse(readFileSync(lockFile, 'utf8')).packages;
  return Object.entries(wanted).every(
    ([path, { version, optional }]) =>
      path === '' || here[path]?.version === version || (optional === true && here[path] === undefined),
  );
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await install();
