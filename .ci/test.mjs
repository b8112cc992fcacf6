/** `npm test`: everything, from a fresh clone. */
import { ensureChromium } from './chromium.mjs';
import { endOnSignal, endWithNpm } from './command.mjs';
import { install } from './install.mjs';
import { fullStages, runStages } from './stages.mjs';

endOnSignal();
endWithNpm();
process.env.CI ??= 'true';
await install();
await ensureChromium();
process.exit((await runStages(fullStages)) ? 0 : 1);
