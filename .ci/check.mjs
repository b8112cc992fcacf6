/** `npm run check`: what can be known in a minute, without a browser. */
import { endOnSignal, endWithNpm } from './command.mjs';
import { install } from './install.mjs';
import { quickStages, runStages } from './stages.mjs';

endOnSignal();
endWithNpm();
await install();
process.exit((await runStages(quickStages)) ? 0 : 1);
