import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';

/**
 * Who runs a profile. The kernel holds the lock, as a name among its abstract sockets, and drops it when its process dies, so
 * nothing stale is ever left; the state file beside it tells others who that is, how far it has come, and what it has started.
 */

/** When a process began, in the kernel's own ticks; null where there is none. Numbers of processes are given out again. */
export function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The second field is the program's name in brackets and may hold anything; the start is the 22nd.
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19];
  } catch {
    return null;
  }
}

export const identityOf = (pid) => ({ pid, start: startOf(pid) });

export const stillRuns = ({ pid, start }) => start !== null && startOf(pid) === start;

export function readState(profile) {
  try {
    return JSON.parse(readFileSync(profile.stateFile, 'utf8'));
  } catch {
    return null;
  }
}

/** Claims the profile for this process; answers null, or the state of the one that has it already. */
export async function claim(profile) {
  const state = readState(profile);
  if (state && stillRuns(state)) return state;
  if (!(await takeLock(profile.lockName))) return readState(profile) ?? { pid: null };
  return null;
}

/** Never half written: others read it at any time. */
export function writeState(profile, state) {
  const draft = `${profile.stateFile}.${process.pid}`;
  writeFileSync(draft, `${JSON.stringify({ ...identityOf(process.pid), ...state }, null, 2)}\n`, { mode: 0o600 });
  renameSync(draft, profile.stateFile);
}

export function clearState(profile) {
  if (existsSync(profile.stateFile)) rmSync(profile.stateFile);
}

function takeLock(name) {
  return new Promise((resolve) => {
    const lock = net.createServer();
    lock.once('error', () => resolve(false));
    lock.listen(`\0${name}`, () => {
      lock.unref();
      resolve(true);
    });
  });
}
