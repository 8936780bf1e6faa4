import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';

/** Debian's Python, which has the Debian packages; another one on the path may not. */
const PYTHON = '/usr/bin/python3';

export interface PythonPeer {
  /** Which of numpy and PyKDL it has. */
  readonly has: readonly string[];
  /** Runs one named job on the data sent at the start. */
  run(job: string): Promise<{ readonly seconds: number; readonly done: number; readonly of: number }>;
  close(): void;
}

/** Starts peer.py and hands it its data; null where there is no such Python. Jobs and answers are one JSON line each. */
export async function startPythonPeer(data: unknown): Promise<PythonPeer | null> {
  if (!existsSync(PYTHON)) return null;
  // One thread, as ours has.
  const env = { ...process.env, OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1' };
  const child = spawn(PYTHON, [fileURLToPath(new URL('./peer.py', import.meta.url))], {
    stdio: ['pipe', 'pipe', 'inherit'],
    env,
  });
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]();
  const ask = async (question: unknown) => {
    child.stdin.write(`${JSON.stringify(question)}\n`);
    const { value, done } = await lines.next();
    if (done) throw new Error('The Python peer ended without an answer.');
    return JSON.parse(value);
  };
  const { has } = await ask(data);
  return { has, run: (job) => ask(job), close: () => child.stdin.end() };
}
