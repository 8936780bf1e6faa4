import { spawn, spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync } from 'node:fs';
import { root } from './profile.mjs';

/** Something that the person at the keyboard has to put right; shown without a stack. */
export class SetupError extends Error {}

/** The command was told to stop while it worked; nothing to report. */
export class Halted extends Error {}

let halted = false;
const steps = new Map();
let tell = () => {};

/** `listener` is told the numbers of the processes that run as steps, whenever they change. */
export function tellOfSteps(listener) {
  tell = () => listener([...steps].filter(([, mustFinish]) => !mustFinish).map(([child]) => child.pid));
}

export function has(command) {
  return spawnSync('sh', ['-c', `command -v ${command}`], { stdio: 'ignore' }).status === 0;
}

/**
 * Runs a command to its end in a group of its own, so that a signal stops it and its children at once. `mustFinish` is for
 * programs that leave damage behind when stopped. Answers code (or signal), standard output, and both outputs in order.
 */
export async function step(command, args, { env = process.env, cwd = root, user, mustFinish = false } = {}) {
  if (halted) throw new Halted();
  const child = spawn(command, args, { cwd, env, ...user, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
  steps.set(child, mustFinish);
  tell();
  let stdout = '';
  let output = '';
  child.stdout.setEncoding('utf8').on('data', (part) => {
    stdout += part;
    output += part;
  });
  child.stderr.setEncoding('utf8').on('data', (part) => (output += part));
  const code = await new Promise((resolve) => {
    child.once('error', (error) => {
      output += error.message;
      resolve(-1);
    });
    child.once('close', (exitCode, signal) => resolve(exitCode ?? signal));
  });
  steps.delete(child);
  tell();
  if (halted) throw new Halted();
  return { code, stdout, output };
}

/** Runs a command and answers its standard output. Throws SetupError with its last words where it fails. */
export async function run(command, args, { quiet = false, hint = '', ...options } = {}) {
  const { code, stdout, output } = await step(command, args, options);
  if (code === 0) return stdout;
  if (quiet) throw new SetupError(output.trim());
  throw new SetupError(`${command} ${args.join(' ')} failed.${hint && `\n${hint}`}\n${lastLines(output, 25)}`);
}

/** Stops the step that runs now and refuses every further one. */
export async function haltSteps() {
  halted = true;
  await Promise.all(
    [...steps].map(([child, mustFinish]) => (mustFinish ? ended(child) : stopGroup(child, { patienceMs: 5000 }))),
  );
}

export function lastLines(text, count) {
  return text.trim().split('\n').slice(-count).join('\n');
}

export function lastLinesOf(file, count) {
  return existsSync(file) ? lastLines(readFileSync(file, 'utf8'), count) : '';
}

/** Starts a process in a group of its own with its output in a file, so that stopping it stops its children too. */
export function start(command, args, { env, log, append = false, cwd = root, user }) {
  const out = openSync(log, append ? 'a' : 'w');
  const child = spawn(command, args, { cwd, env, ...user, detached: true, stdio: ['ignore', out, out] });
  closeSync(out);
  return child;
}

const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null || child.pid === undefined;

function ended(child) {
  return hasEnded(child) ? Promise.resolve() : new Promise((resolve) => child.once('exit', resolve));
}

export async function stopGroup(child, { signal = 'SIGTERM', lastSignal = 'SIGKILL', patienceMs = 20_000 } = {}) {
  if (hasEnded(child)) return;
  signalGroup(child.pid, signal);
  const timer = setTimeout(() => signalGroup(child.pid, lastSignal), patienceMs);
  await ended(child);
  clearTimeout(timer);
}

export function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // Gone already.
  }
}

export const sleep = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/** Waits until `check` answers true. Throws SetupError with `words()` after `seconds`, or at once when `child` has ended. */
export async function until(check, { seconds, words, child }) {
  const end = Date.now() + seconds * 1000;
  while (!(await check())) {
    if (halted) throw new Halted();
    if ((child && hasEnded(child)) || Date.now() > end) throw new SetupError(words());
    await sleep(150);
  }
}
