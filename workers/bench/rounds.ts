/** One way of doing a fixed piece of work. `run` does it once and answers the seconds it took, by whatever clock is fair to it. */
export interface Contender {
  readonly name: string;
  readonly run: () => number | Promise<number>;
}

export const ROUNDS = 5;

/**
 * Runs all contenders in turn, round after round, so that whatever else the machine does falls on all of them alike; each once before to warm
 * up. Answers the median seconds of each.
 */
export async function interleaved(contenders: readonly Contender[], rounds = ROUNDS): Promise<number[]> {
  const seconds: number[][] = contenders.map(() => []);
  for (let round = -1; round < rounds; round++)
    for (const [i, { run }] of contenders.entries()) {
      const taken = await run();
      if (round >= 0) seconds[i].push(taken);
    }
  return seconds.map(median);
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
