import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { claim, clearState, identityOf, readState, startOf, stillRuns, writeState } from './claim.mjs';

let profile;
const helpers = [];

beforeEach(() => {
  const folder = mkdtempSync(path.join(tmpdir(), 'claim-'));
  profile = { folder, stateFile: path.join(folder, 'running.json'), lockName: `elbowroom-${path.basename(folder)}` };
});
afterEach(async () => {
  for (const helper of helpers.splice(0)) await kill(helper);
  rmSync(profile.folder, { recursive: true });
});

async function kill(helper) {
  if (helper.exitCode !== null || helper.signalCode !== null) return;
  helper.kill('SIGKILL');
  await once(helper, 'exit');
}

/** Another process that claims the profile, says what it was answered, and stays. */
async function claimElsewhere() {
  const source = `
    import { claim, writeState } from ${JSON.stringify(new URL('claim.mjs', import.meta.url).href)};
    const profile = ${JSON.stringify(profile)};
    const other = await claim(profile);
    if (!other) writeState(profile, { step: 'Building' });
    console.log(JSON.stringify(other));
    setInterval(() => {}, 1000);`;
  const helper = spawn(process.execPath, ['--input-type=module', '-e', source], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  helpers.push(helper);
  const [answer] = await once(helper.stdout, 'data');
  return { helper, answer: JSON.parse(answer) };
}

describe('a process', () => {
  it('is told by its number and its start together', async () => {
    expect(stillRuns(identityOf(process.pid))).toBe(true);
    expect(stillRuns({ pid: process.pid, start: '1' })).toBe(false);
    const gone = spawn('true');
    const identity = identityOf(gone.pid);
    await once(gone, 'exit');
    expect(startOf(gone.pid)).toBeNull();
    expect(stillRuns(identity)).toBe(false);
    expect(stillRuns({ pid: gone.pid, start: null })).toBe(false);
  });
});

describe('the claim on a profile', () => {
  it('is given to one, and tells the next who that is and how far it has come', async () => {
    const first = await claimElsewhere();
    expect(first.answer).toBeNull();
    expect(await claim(profile)).toMatchObject({ pid: first.helper.pid, step: 'Building' });
    expect((await claimElsewhere()).answer).toMatchObject({ pid: first.helper.pid });
  });

  it('is free again when its holder was killed, whatever that has left in the state file', async () => {
    const first = await claimElsewhere();
    await kill(first.helper);
    expect(readState(profile)).toMatchObject({ pid: first.helper.pid });
    expect((await claimElsewhere()).answer).toBeNull();
  });

  it('is held before anything is written down', async () => {
    const first = await claimElsewhere();
    clearState(profile);
    expect(await claim(profile)).toEqual({ pid: null });
    writeFileSync(profile.stateFile, '{"pid": 12');
    expect(await claim(profile)).toEqual({ pid: null });
    expect(first.helper.exitCode).toBeNull();
  });

  it('goes to exactly one of several who ask at the same moment', async () => {
    const answers = await Promise.all([1, 2, 3, 4].map(claimElsewhere));
    expect(answers.filter(({ answer }) => answer === null)).toHaveLength(1);
  });

  it('leaves a state that others can read while it is written', () => {
    writeState(profile, { step: 'Seeding', children: { web: { pid: 1, start: '2' } } });
    expect(readState(profile)).toEqual({
      ...identityOf(process.pid),
      step: 'Seeding',
      children: { web: { pid: 1, start: '2' } },
    });
  });
});
