/** The long form of the crash test: `npm run crash`, or with another number of kills as the argument. */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type CrashReport, crashDriver, crashQueue } from './harness.js';

const kills = Number(process.argv[2] ?? 200);
const folder = await mkdtemp(join(tmpdir(), 'layerwright-crash-'));
try {
  const queue = await crashQueue({
    kills,
    folder,
    seed: 1,
    onKill: (report) => {
      if (report.kills % 10 === 0) say('  ', report);
    },
  });
  say('Snapshots:', queue);
  const driver = await crashDriver({ kills: 30, folder });
  say("The driver's own saving (must fail):", driver);
  if (queue.lost + queue.unusable > 0 || driver.lost + driver.unusable === 0) process.exitCode = 1;
} finally {
  await rm(folder, { recursive: true, force: true });
}

function say(title: string, report: CrashReport): void {
  process.stdout.write(
    `${title} ${report.kills} kills, ${report.acknowledged} acknowledged writes, ${report.lost} lost, ` +
      `${report.unusable} unusable databases, slowest restart ${Math.round(report.slowestRestartMs)} ms\n`,
  );
}
