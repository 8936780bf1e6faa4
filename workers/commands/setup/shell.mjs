import { spawn, spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync } from 'node:fs';
import { root } from './profile.mjs';

/** Something that the person at the keyboard has to put right; shown without a stack. */
export class SetupError extends Error {}

export function has(command) {
  return spawnSync('sh', ['-c', `command -v ${command}`], { stdio: 'ignore' }).status === 0;
}

/** Runs a command to its end. Throws SetupError with its last words where it fails. */
export function run(command, args, { env = process.env, input, quiet = false, hint = '' } = {}) {
  const result = spawnSync(command, args, { cwd: root, env, input, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
  if (result.status === 0) return result.stdout;
  const words = `${result.stdout ?? ''}${result.stderr ?? ''}${result.error?.message ?? ''}`.trim();
  if (quiet) throw new SetupError(words);
  throw new SetupError(`${command} ${args.join(' ')} failed.${hint && `\n${hint}`}\n${lastLines(words, 25)}`);
}

export function lastLines(text, count) {
  return text.trim().split('\n').slice(-count).join('\n');
}

export function lastLinesOf(file, count) {
  return existsSync(file) ? lastLines(readFileSync(file, 'utf8'), count) : '';
}

/** Starts a process in a group of its own with its output in a file, so that stopping it stops its children too. */
export function start(command, args, { env, log, append = true }) {
  const out = openSync(log, append ? 'a' : 'w');
  const child = spawn(command, args, { cwd: root, env, detached: true, stdio: ['ignore', out, out] });
  closeSync(out);
  return child;
}

export async function stopGroup(child, patienceMs = 20_000) {
  if (!child || child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise((resolve) => child.once('exit', resolve));
  signalGroup(child.pid, 'SIGTERM');
  const timer = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), patienceMs);
  await ended;
  clearTimeout(timer);
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // Gone already.
  }
}

export const sleep = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/** Waits until `check` answers true. Throws SetupError with `words()` after `seconds`, or as soon as `failed` answers true. */
export async function until(check, { seconds, words, failed = () => false }) {
  const end = Date.now() + seconds * 1000;
  while (!(await check())) {
    if (failed() || Date.now() > end) throw new SetupError(words());
    await sleep(150);
  }
}
