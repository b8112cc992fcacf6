/** `npm run dev`: server and client from their sources, both reloading when a file is saved. */
import { buildKernel } from './build.mjs';
import { endChildren, endOnSignal, endWithNpm, start, stopWith, tool } from './command.mjs';
import { install } from './install.mjs';

endOnSignal();
endWithNpm();
await install();
const kernel = await buildKernel();
if (kernel.code !== 0) stopWith(kernel.output);

const host = '127.0.0.1';
const clientPort = process.env.PORT ?? '4200';
// The port that src/proxy.conf.json sends /api to.
const serverPort = '4210';

const server = start(
  process.execPath,
  [tool('tsx'), 'watch', '--tsconfig', 'server/tsconfig.json', 'server/main.ts'],
  {
    env: { HOST: host, PORT: serverPort, PUBLIC_URL: `http://${host}:${clientPort}` },
  },
);
const client = start(
  process.execPath,
  [tool('@angular/cli', 'ng'), 'serve', `--host=${host}`, `--port=${clientPort}`],
  { env: { NG_CLI_ANALYTICS: 'false' } },
);

// One without the other is of no use.
for (const child of [server, client]) {
  child.on('close', (code) => {
    endChildren();
    process.exitCode = code ?? 1;
  });
}
