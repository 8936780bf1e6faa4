import { arch, cpus, loadavg } from 'node:os';
import { compareAnalysisAndInverse } from '../bench/analysis-and-inverse';
import { compareWithBaseRate } from '../bench/base-rate';
import { heapGrowth } from '../bench/heap';
import { frames } from '../bench/browser/frames';
import { liveMap } from '../bench/browser/live-map';
import { judge } from '../bench/judge';
import { compareRoutes, growth } from '../bench/maps';
import { say, title } from '../bench/print';
import { ROUNDS } from '../bench/rounds';
import { compareWithLibrary } from '../bench/singular-value-library';
import { compareWorkers } from '../bench/two-workers';

/**
 * How quick the computation is, beside other ways of doing the same. With names as arguments only those parts run, for instance
 * `npm run bench -- base maps`. Ends with 1 where counts or sums differ from the C++ program's.
 */
const PARTS: Record<string, () => Promise<void>> = {
  base: compareWithBaseRate,
  library: compareWithLibrary,
  inverse: compareAnalysisAndInverse,
  maps: compareRoutes,
  growth,
  heap: heapGrowth,
  workers: compareWorkers,
  judge,
  live: liveMap,
  frames,
};

const asked = process.argv.slice(2);
const unknown = asked.filter((name) => !(name in PARTS));
if (unknown.length > 0) {
  process.stderr.write(`No part named ${unknown.join(', ')}. There are: ${Object.keys(PARTS).join(', ')}.\n`);
  process.exit(2);
}

title(`${cpus()[0].model.trim()}, ${arch()}, Node ${process.version}, load ${loadavg()[0].toFixed(1)}`);
say(`Medians of ${ROUNDS} interleaved rounds. "ours is 2.00×" means twice as quick as what stands beside it.`);
say(
  'Pin it to one processor for steady numbers, for instance: taskset -c 1 npm run bench -- base library inverse maps',
);
/** These need the product running, so they only run when asked for. */
const ON_REQUEST: readonly string[] = ['live', 'frames'];

const usual = Object.keys(PARTS).filter((name) => !ON_REQUEST.includes(name));
for (const name of asked.length > 0 ? asked : usual) await PARTS[name]();
