/** `npm run dev`: server and client from their sources, both reloading when a file is saved. */
import { buildKernel } from './build.mjs';
import { endChildren, endOnSignal, endWithNpm, start, stopWith, tool } from './command.mjs';
import { install } from './install.mjs';

endOnSignal();
endWithNpm();
await install();
const kernel = await buildKernel();
if (kernel.code !== 0) stopWith(kernel.output);

// The port that src/proxy.conf.json sends /api to.
const server = start(
  process.execPath,
  [tool('tsx'), 'watch', '--tsconfig', 'server/tsconfig.json', 'server/main.ts'],
  {
    env: { HOST: '127.0.0.1', PORT: '4210' },
  },
);
const client = start(
  process.execPath,
  [tool('@angular/cli', 'ng'), 'serve', '--host=127.0.0.1', `--port=${process.env.PORT ?? 4200}`],
  { env: { NG_CLI_ANALYTICS: 'false' } },
);

// One without the other is of no use.
for (const child of [server, client]) {
  child.on('close', (code) => {
    endChildren();
    process.exitCode = code ?? 1;
  });
}
