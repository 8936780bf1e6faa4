import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';

export interface WorkerProcess {
  readonly process: ChildProcess;
  /** Messages of its log, oldest first. */
  readonly messages: string[];
  /** Ends it as an operating system would that runs out of memory: nothing is tidied up. */
  readonly kill: () => Promise<void>;
  /** Asks it to stop and tells its exit code. */
  readonly stop: () => Promise<number | null>;
}

/** Starts the product's worker on the database of this test and waits until it takes jobs. */
export async function startWorker(environment: Record<string, string> = {}): Promise<WorkerProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'workers/worker.ts'], {
    env: { ...process.env, LOG_LEVEL: 'info', ...environment },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const messages: string[] = [];
  const exited = once(child, 'exit') as Promise<[number | null]>;
  const ready = new Promise<void>((resolve) => {
    createInterface({ input: child.stdout }).on('line', (line) => {
      const { msg } = JSON.parse(line) as { msg: string };
      messages.push(msg);
      if (msg === 'worker ready') resolve();
    });
  });
  const early = exited.then(([code]) => {
    throw new Error(`The worker ended with ${code} before it was ready: ${messages.join('; ')}`);
  });
  await Promise.race([ready, early]);
  early.catch(() => undefined);
  const end = async (signal: NodeJS.Signals): Promise<number | null> => {
    if (child.exitCode === null && child.signalCode === null) child.kill(signal);
    return (await exited)[0];
  };
  return {
    process: child,
    messages,
    kill: async () => void (await end('SIGKILL')),
    stop: () => end('SIGTERM'),
  };
}
