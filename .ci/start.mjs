/** `npm start`: from whatever state the folder is in to the application on one port. */
import { request } from 'node:http';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from './build.mjs';
import { endOnSignal, endWithNpm, root, stopWith } from './command.mjs';
import { install } from './install.mjs';

const host = process.env.HOST || '127.0.0.1';
/** What a browser on this machine can open when the server listens on every address. */
const reachable = host === '0.0.0.0' || host === '::' ? 'localhost' : host;
const port = Number(process.env.PORT || 4210);
const stopListening = endOnSignal();
endWithNpm();

await install();
const { code, output } = await build((line) => process.stdout.write(line));
if (code !== 0) stopWith(`${output}\nThe build failed; see the lines above.`);

// From here on this process is the server: signals reach it directly, and it shuts down in its own order.
stopListening();
process.env.NODE_ENV ??= 'production';
process.setSourceMapsEnabled(true);
const main = join(root, 'dist', 'server', 'server', 'main.js');
process.argv[1] = main;
await import(pathToFileURL(main).href);
await answering();
const named = reachable.includes(':') ? `[${reachable}]` : reachable;
process.stdout.write(`\nLayerwright is at ${process.env.PUBLIC_URL || `http://${named}:${port}`}\n`);

/** Resolves when the server answers its health route. It logs itself why, should it not. */
async function answering() {
  for (;;) {
    const answered = await new Promise((resolve) => {
      const asked = request({ host: reachable, port, path: '/api/health', timeout: 2000 }, (answer) => {
        answer.resume();
        resolve(answer.statusCode === 200);
      });
      asked.on('error', () => resolve(false));
      asked.on('timeout', () => asked.destroy());
      asked.end();
    });
    if (answered) return;
    await new Promise((resolve) => setTimeout(resolve, 100).unref());
  }
}
