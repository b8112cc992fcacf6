/** `npm test`: everything, from a fresh clone. */
import { ensureChromium } from './chromium.mjs';
import { endOnSignal } from './command.mjs';
import { install } from './install.mjs';
import { fullStages, runStages } from './stages.mjs';

endOnSignal();
process.env.CI ??= 'true';
await install();
await ensureChromium();
process.exit((await runStages(fullStages)) ? 0 : 1);
