/** One way of doing a fixed piece of work. `run` does it once and answers the seconds it took, by whatever clock is fair to it. */
export interface Contender {
  readonly name: string;
  readonly run: () => number | Promise<number>;
}

export const ROUNDS = 5;
/** Seconds that a contender runs before it is measured, so that its code is compiled, and at least in each round, so that one pause weighs little. */
const WARM_UP = 0.5;
const ROUND = 0.03;

/**
 * Runs all contenders in turn, round after round, so that whatever else the machine does falls on all of them alike. Answers the median
 * seconds of each.
 */
export async function interleaved(contenders: readonly Contender[], rounds = ROUNDS): Promise<number[]> {
  for (const contender of contenders) await average(contender, WARM_UP);
  const seconds: number[][] = contenders.map(() => []);
  for (let round = 0; round < rounds; round++)
    for (const [i, contender] of contenders.entries()) seconds[i].push(await average(contender, ROUND));
  return seconds.map(median);
}

/** Mean seconds of as many runs as fill a stretch of time. */
async function average({ run }: Contender, stretch: number): Promise<number> {
  let total = 0;
  let runs = 0;
  while (total < stretch) {
    total += await run();
    runs++;
  }
  return total / runs;
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

/** Wall-clock seconds of a synchronous piece of work. */
export function secondsOf(work: () => void): number {
  const start = process.hrtime.bigint();
  work();
  return Number(process.hrtime.bigint() - start) / 1e9;
}
