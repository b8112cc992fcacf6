/**
 * `npm run bench`: how quick the pattern is on this machine. Prints ratios measured in one run, interleaved A, B, B, A, as
 * the median of the rounds with their quartiles; a run whose A/A pair strays past 0.9–1.1 is void. Counted work is exact.
 * Nothing here is a test: the counters are asserted in the specs.
 */
import { tsImport } from 'tsx/esm/api';
import { buildKernel } from './build.mjs';
import { stopWith } from './command.mjs';

const ROUNDS = 11;

const kernelBuilt = await buildKernel();
if (kernelBuilt.code !== 0) stopWith(kernelBuilt.output);
const { workloads } = await tsImport('../shared/pattern/testing/workloads.ts', import.meta.url);
const { engines, pictures, counts } = workloads();

/** Milliseconds of processor time that `run` takes: what a machine with nothing else to do would need. */
function timed(run) {
  const start = process.cpuUsage();
  run();
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1000;
}

function quantile(sorted, share) {
  const at = (sorted.length - 1) * share;
  const low = Math.floor(at);
  return sorted[low] + (sorted[Math.ceil(at)] - sorted[low]) * (at - low);
}

function summary(values) {
  const sorted = [...values].sort((a, b) => a - b);
  return { median: quantile(sorted, 0.5), low: quantile(sorted, 0.25), high: quantile(sorted, 0.75) };
}

/** Time of `b` over time of `a`, round by round. */
function ratios(a, b) {
  const found = [];
  for (let round = 0; round < ROUNDS; round++) {
    const first = timed(a);
    const second = timed(b);
    const third = timed(b);
    const fourth = timed(a);
    found.push((second + third) / (first + fourth));
  }
  return summary(found);
}

const row = (name, value, target) => console.log(`${name.padEnd(66)} ${value.padEnd(26)} ${target}`);
const asRatio = ({ median, low, high }) => `${median.toFixed(2)} (${low.toFixed(2)}–${high.toFixed(2)})`;
const asTime = ({ median, low, high }) => `${median.toFixed(0)} ms (${low.toFixed(0)}–${high.toFixed(0)})`;

console.log(`pattern, ${ROUNDS} rounds, Node ${process.version}\n`);
for (const { run } of engines) for (let i = 0; i < 3; i++) run();
const [kernel, typed, closures, noise] = engines.map(({ run }) => run);

const same = ratios(kernel, kernel);
row('kernel against itself', asRatio(same), '0.9–1.1, else this run is void');
if (same.median < 0.9 || same.median > 1.1) console.log('This run is void: the machine was too busy.\n');
row('typed-array float64 loops over the kernel, 15 ops', asRatio(ratios(kernel, typed)), '≥ 8');
row('a closure for each op over the kernel, 15 ops', asRatio(ratios(kernel, closures)), '≥ 20');
row('the kernel’s 15 ops over one simplex noise', asRatio(ratios(noise, kernel)), '≤ 0.6');
const perOp = summary(Array.from({ length: ROUNDS }, () => (timed(kernel) * 1e6) / engines[0].operations));
row('kernel, for each sample and op', `${perOp.median.toFixed(2)} ns`, '');

console.log();
for (const { name, run, targetMs } of pictures) {
  run();
  row(name, asTime(summary(Array.from({ length: ROUNDS }, () => timed(run)))), `≤ ${targetMs} ms`);
}

console.log();
for (const { name, value, target } of counts()) row(name, value, target);
