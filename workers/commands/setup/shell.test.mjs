import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { startOf } from './claim.mjs';

let folder;
let shell;

beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'shell-'));
  // A halt is for good, so every test begins with a shell of its own.
  vi.resetModules();
  shell = await import('./shell.mjs');
});
afterEach(() => rmSync(folder, { recursive: true }));

describe('a step', () => {
  it('answers its output, and fails with its last words', async () => {
    expect(await shell.run('sh', ['-c', 'echo out; echo err >&2'])).toBe('out\n');
    await expect(shell.run('sh', ['-c', 'echo why >&2; exit 3'], { hint: 'Try again' })).rejects.toThrow(
      /failed\.\nTry again\nwhy$/,
    );
    await expect(shell.run('no-such-program', [])).rejects.toThrow('ENOENT');
    expect(await shell.step('sh', ['-c', 'kill -9 $$'])).toMatchObject({ code: 'SIGKILL' });
  });

  it('is stopped at once with all of its children, and no further one begins', async () => {
    const note = path.join(folder, 'child');
    const forever = shell.run('sh', ['-c', `sleep 600 & echo $! > ${note}; wait`]);
    const refused = expect(forever).rejects.toBeInstanceOf(shell.Halted);
    const childOf = () => Number(readFileSync(note, 'utf8'));
    await vi.waitUntil(() => startOf(tryOr(childOf)) !== null, { timeout: 20_000 });
    await shell.haltSteps();
    await refused;
    await vi.waitUntil(() => startOf(childOf()) === null, { timeout: 20_000 });
    await expect(shell.run('true', [])).rejects.toBeInstanceOf(shell.Halted);
  });

  it('is waited for where stopping it would do damage', async () => {
    const note = path.join(folder, 'done');
    const whole = shell.run('sh', ['-c', `sleep 0.3; echo whole > ${note}`], { mustFinish: true });
    const refused = expect(whole).rejects.toBeInstanceOf(shell.Halted);
    await shell.haltSteps();
    expect(readFileSync(note, 'utf8')).toBe('whole\n');
    await refused;
  });
});

function tryOr(read) {
  try {
    return read();
  } catch {
    return -1;
  }
}

describe('waiting', () => {
  it('ends when the process that is waited for was killed by a signal', async () => {
    const child = shell.start('sleep', ['600'], { env: process.env, log: path.join(folder, 'log') });
    const waiting = shell.until(async () => false, { seconds: 600, child, words: () => 'It does not answer.' });
    child.kill('SIGKILL');
    await expect(waiting).rejects.toThrow('It does not answer.');
  });
});
