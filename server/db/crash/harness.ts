import { readFile, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { pino } from 'pino';
import { FAULTY_CALLS } from '../../testing/faulty-file-system.js';
import { seededRandom } from '../../testing/seeded-random.js';
import { EmbeddedDatabase } from '../embedded-database.js';
import { Design } from '../entities/index.js';
import { openDatabase } from '../open-database.js';
import { verifyImage } from '../verify-image.js';
import { compileChild } from './compiled-child.js';
import type { Order } from './order.js';
import { Victim } from './victim.js';

export interface CrashReport {
  readonly kills: number;
  /** Writes that were acknowledged before the kills. */
  readonly acknowledged: number;
  /** Acknowledged writes that were not there afterwards. */
  readonly lost: number;
  /** Kills after which the database could not be opened. */
  readonly unusable: number;
  /** The longest time that opening the database after a kill took, ms. */
  readonly slowestRestartMs: number;
}

interface CrashPlan {
  readonly kills: number;
  readonly folder: string;
  readonly seed: number;
  readonly onKill?: (report: CrashReport) => void;
}

/** A process that was to end itself is killed after this. */
const PATIENCE_MS = 60_000;

const NOTHING: CrashReport = { kills: 0, acknowledged: 0, lost: 0, unusable: 0, slowestRestartMs: 0 };

/**
 * Kills a process that writes through the queue, again and again on the same folder: from outside a random moment after a
 * random number of writes, or at a random call of the file system. After each kill the folder is opened as at a start.
 */
export async function crashQueue(plan: CrashPlan): Promise<CrashReport> {
  const random = seededRandom(plan.seed);
  return crash({ ...plan, isEnough: () => false }, async (victim, run) => {
    const order: Order = { kind: 'queue', folder: plan.folder, run };
    const call = FAULTY_CALLS[Math.floor(random() * FAULTY_CALLS.length)];
    const dieAt = call && random() < 0.5 ? { call, nth: 4 + Math.floor(random() * 12) } : undefined;
    const writes = 1 + Math.floor(random() * 250);
    const moreMs = random() * 60;
    const acknowledged = await victim.run({ ...order, dieAt }, async () => {
      if (dieAt) return sleep(PATIENCE_MS, undefined, { ref: false });
      await victim.acknowledges(writes);
      await sleep(moreMs);
    });
    return { acknowledged, revisions: () => revisionsInFolder(plan.folder) };
  });
}

/** The same with the driver's own saving, killed while a save is under way, until it has failed once. */
export async function crashDriver(plan: Omit<CrashPlan, 'seed'>): Promise<CrashReport> {
  const file = join(plan.folder, 'control.sqlite');
  return crash({ ...plan, isEnough: ({ lost, unusable }) => lost + unusable > 0 }, async (victim, run) => {
    const acknowledged = await victim.run({ kind: 'driver', folder: file, run }, () => shorter(file));
    return { acknowledged, revisions: () => revisionsInFile(file) };
  });
}

/** Resolves when the file is shorter than it was: it is being written over. */
async function shorter(file: string): Promise<void> {
  const { size } = await stat(file);
  for (const from = performance.now(); performance.now() - from < 5000;) {
    if ((await stat(file)).size < size) return;
  }
}

interface Crashed {
  readonly acknowledged: ReadonlyMap<string, number>;
  readonly revisions: () => Promise<ReadonlyMap<string, number>>;
}

async function crash(
  plan: Omit<CrashPlan, 'seed'> & { readonly isEnough: (report: CrashReport) => boolean },
  killOnce: (victim: Victim, run: string) => Promise<Crashed>,
): Promise<CrashReport> {
  let report = NOTHING;
  // Loading the modules takes longer than a run, so the next process loads them meanwhile.
  const child = await compileChild();
  let next = new Victim(child.script);
  try {
    while (report.kills < plan.kills && !plan.isEnough(report)) {
      const victim = next;
      next = new Victim(child.script);
      report = await assessed(report, await killOnce(victim, `run${report.kills}`));
      plan.onKill?.(report);
    }
  } finally {
    next.kill();
    await child.remove();
  }
  return report;
}

async function assessed(report: CrashReport, crashed: Crashed): Promise<CrashReport> {
  const { acknowledged } = crashed;
  let revisions: ReadonlyMap<string, number> = new Map();
  let unusable = 0;
  const from = performance.now();
  try {
    revisions = await crashed.revisions();
  } catch {
    unusable = 1;
  }
  const restartMs = performance.now() - from;
  let lost = 0;
  let promised = 0;
  for (const [id, revision] of acknowledged) {
    promised += revision;
    lost += Math.max(0, revision - (revisions.get(id) ?? 0));
  }
  return {
    kills: report.kills + 1,
    acknowledged: report.acknowledged + promised,
    lost: report.lost + lost,
    unusable: report.unusable + unusable,
    slowestRestartMs: Math.max(report.slowestRestartMs, restartMs),
  };
}

async function revisionsInFolder(folder: string): Promise<ReadonlyMap<string, number>> {
  const database = await openDatabase({ folder, log: pino({ level: 'silent' }) });
  try {
    return await database.units.read(async (manager) =>
      revisionsOf(await manager.findBy(Design, { searchKey: 'run' })),
    );
  } finally {
    await database.close();
  }
}

async function revisionsInFile(file: string): Promise<ReadonlyMap<string, number>> {
  const image = await readFile(file);
  const reason = await verifyImage(image);
  if (reason !== null) throw new Error(reason);
  const database = await EmbeddedDatabase.open(image);
  try {
    return revisionsOf(await database.manager.findBy(Design, { searchKey: 'run' }));
  } finally {
    await database.close();
  }
}

function revisionsOf(designs: readonly Design[]): ReadonlyMap<string, number> {
  return new Map(designs.map(({ id, revision }) => [id, revision]));
}
