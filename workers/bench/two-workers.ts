import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { milliseconds, ratio, say, table, title } from './print';
import { interleaved } from './rounds';

/** Rows of one map shared out among worker processes, as the queue shares tiles out. */
export async function compareWorkers() {
  title('A map of 1 000 000 points by one worker process and by two');
  const workers = [startWorker(), startWorker()];
  await Promise.all(workers.map((worker) => once(worker, 'message')));
  const halves = ['first', 'second'];
  const share = async (parts: readonly string[]) => {
    const start = process.hrtime.bigint();
    await Promise.all(
      parts.map((part, i) => {
        workers[i].send(part);
        return once(workers[i], 'message');
      }),
    );
    return Number(process.hrtime.bigint() - start) / 1e9;
  };
  const [one, two] = await interleaved([
    { name: 'one', run: () => share(['whole']) },
    { name: 'two', run: () => share(halves) },
  ]);
  workers.forEach((worker) => worker.disconnect());
  table(
    ['workers', 'time', 'is'],
    [
      ['1', milliseconds(one), ''],
      ['2', milliseconds(two), ratio(one / two)],
    ],
  );
  say(`This process may use ${availableParallelism()} processors.`);
}

function startWorker(): ChildProcess {
  return fork(fileURLToPath(new URL('./map-process.ts', import.meta.url)), { execArgv: ['--import', 'tsx'] });
}
