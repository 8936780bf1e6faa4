import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { BUILT_IN, OTHER_CHAINS, REFERENCE_ARMS, type ReferenceArm } from './arms';
import { disagreement, freedomsInKernel, type Reference } from './compare';

/**
 * Poses, Jacobians, singular values and polytope speeds against Debian's numpy and PyKDL. The committed file holds the answers for forty
 * postures an arm; where the packages are present the script runs again with a thousand.
 */

const PYTHON = '/usr/bin/python3';
const folder = new URL('.', import.meta.url);
const committed = JSON.parse(readFileSync(new URL('reference.json', folder), 'utf8')) as Reference;
/** What the issue asks for; both sides keep some three digits more. */
const AGREES = 1e-9;

function generate(arms: readonly ReferenceArm[], postures: number): Reference {
  const script = new URL('generate.py', folder).pathname;
  const run = spawnSync(PYTHON, [script, String(postures)], {
    input: JSON.stringify(arms),
    encoding: 'utf8',
    maxBuffer: 2 ** 28,
  });
  if (run.status !== 0) throw new Error(`generate.py failed: ${run.stderr}`);
  return JSON.parse(run.stdout) as Reference;
}

function expectAgreement(entry: Reference['arms'][number]) {
  for (const [field, difference] of Object.entries(disagreement(entry)))
    expect(difference, `${field} of ${entry.name}`).toBeLessThan(AGREES);
}

describe('the committed reference data', () => {
  it('is of the arms as they are now (if not: make it anew as print-arms.ts says)', () => {
    const plain = JSON.parse(JSON.stringify(REFERENCE_ARMS)) as unknown;
    expect(committed.arms.map(({ name, arm, freedoms }) => ({ name, arm, freedoms }))).toEqual(plain);
  });

  it.each(committed.arms.map((entry) => [entry.name, entry] as const))('%s agrees with it', (_, entry) => {
    expect(entry.answers).toHaveLength(40);
    expectAgreement(entry);
  });

  it.each(REFERENCE_ARMS.map((entry) => [entry.name, entry] as const))('%s controls what it should', (_, entry) => {
    expect(freedomsInKernel(entry)).toEqual(entry.freedoms);
  });
});

const probe = spawnSync(PYTHON, ['-c', 'import numpy, PyKDL'], { encoding: 'utf8' });
const missing = probe.error ? `${PYTHON} is not there` : probe.stderr.trim().split('\n').pop();

describe('fresh reference data', () => {
  it('agrees on 1,000 postures of each built-in arm and 100 of each other chain', { timeout: 900_000 }, (context) => {
    if (probe.status !== 0) {
      console.info(`Only the committed reference data was checked: ${missing}.`);
      context.skip('needs python3-numpy and python3-pykdl');
    }
    const builtIn = generate(BUILT_IN, 1000);
    const others = generate(OTHER_CHAINS, 100);
    expect(builtIn.arms.every((entry) => entry.answers.length === 1000)).toBe(true);
    for (const entry of [...builtIn.arms, ...others.arms]) expectAgreement(entry);
  });
});
