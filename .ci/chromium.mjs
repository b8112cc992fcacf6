/** Finds Chromium for the tests, or installs Debian's where that is possible. */
import { existsSync } from 'node:fs';
import { run, stopWith } from './command.mjs';

const places = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** Makes sure that `CHROME_BIN` names a browser, for this process and its children. */
export async function ensureChromium() {
  if (process.env.CHROME_BIN && existsSync(process.env.CHROME_BIN)) return;
  if (process.env.CHROME_BIN)
    stopWith(`CHROME_BIN names ${process.env.CHROME_BIN}, but there is no such file.`);
  let found = places.find(existsSync);
  if (found === undefined && process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    process.stdout.write('Installing Chromium (once) …\n');
    await aptGet('update');
    await aptGet('install', '--yes', '--no-install-recommends', 'chromium');
    found = places.find(existsSync);
  }
  if (found === undefined) {
    stopWith(
      'The browser tests need Chromium. Install it (on Debian, as root: apt-get install chromium)\n' +
        'or set CHROME_BIN to the path of a Chrome or Chromium, then run npm test again.',
    );
  }
  process.env.CHROME_BIN = found;
}

async function aptGet(...args) {
  const { code, output } = await run('apt-get', ['-q', ...args], {
    env: { DEBIAN_FRONTEND: 'noninteractive' },
  });
  if (code !== 0)
    stopWith(`${output}\napt-get ${args.join(' ')} failed, so there is no Chromium for the browser tests.`);
}
