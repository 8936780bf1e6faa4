import { mkdtemp, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkCredentials } from '@/lib/server/session/check-credentials';
import { Arm, Membership, Organisation, User } from '@/models';
import { readDemoAccounts } from '@/workers/seed/base/accounts-file';
import { seedBase } from '@/workers/seed/base';
import { someAddress } from '../factories';

let folder: string;
let file: string;
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'elbowroom-seed-'));
  file = path.join(folder, 'new', 'accounts.json');
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const signsIn = async ({ email, password }: { email: string; password: string }) =>
  (await checkCredentials({ email, password }, { 'x-forwarded-for': someAddress() })) !== null;

describe('the base seed', () => {
  it('makes an account a role, whose passwords are in the file and nowhere else', async () => {
    const { brackwater, osterlode } = await seedBase(file);
    expect(brackwater.organisationId).not.toBe(osterlode.organisationId);
    const accounts = await readDemoAccounts(file);
    expect(accounts.map(({ role, organisation }) => `${role} of ${organisation}`)).toEqual([
      'planner of Brackwater Integration',
      'integrator of Brackwater Integration',
      'admin of Brackwater Integration',
      'viewer of Brackwater Integration',
      'integrator of Osterlode Fixtures',
    ]);
    for (const account of accounts) expect(await signsIn(account), account.email).toBe(true);
    expect((await stat(file)).mode & 0o777).toBe(0o600);
    expect(new Set(accounts.map((account) => account.password)).size).toBe(accounts.length);
  });

  it('run again, changes nothing', async () => {
    const context = await seedBase(file);
    const organisationId = [context.brackwater.organisationId, context.osterlode.organisationId];
    const emails = (await readDemoAccounts(file)).map((account) => account.email);
    const count = () =>
      Promise.all([
        Organisation.count({ where: { name: ['Brackwater Integration', 'Osterlode Fixtures'] } }),
        User.count({ where: { email: emails } }),
        Membership.count({ where: { organisationId } }),
        Arm.count({ where: { organisationId } }),
      ]);
    const [before, rows] = [await readFile(file, 'utf8'), await count()];
    expect(rows.slice(0, 3)).toEqual([2, 5, 5]);
    expect(await seedBase(file)).toEqual(context);
    expect(await readFile(file, 'utf8')).toBe(before);
    expect(await count()).toEqual(rows);
  });

  it('gives new passwords where the file was lost, so that it is always right', async () => {
    await seedBase(file);
    const [before] = await readDemoAccounts(file);
    await writeFile(file, 'lost');
    await seedBase(file);
    const accounts = await readDemoAccounts(file);
    expect(await signsIn(before)).toBe(false);
    for (const account of accounts) expect(await signsIn(account), account.email).toBe(true);
  });
});
