import type { MemberActor } from '@/lib/server/policy';
import { createOrganisation } from '@/lib/server/organisations/create-organisation';
import { plantBuiltInArms } from '@/lib/server/organisations/plant-built-in-arms';
import { inTransaction } from '@/lib/server/database';
import type { Transaction } from '@/lib/server/database';
import { hashPassword, verifyPassword } from '@/lib/server/passwords';
import { Membership, Organisation, Project, ProjectViewer, User } from '@/models';
import type { SeedContext } from '../context';
import { makePassword, readDemoAccounts, writeDemoAccounts } from './accounts-file';
import type { DemoAccount } from './accounts-file';
import { BRACKWATER, OSTERLODE, VIEWER_PROJECT } from './people';
import type { Person } from './people';

/**
 * Makes both organisations, their arms and one account a role, as far as they are missing. Passwords are made once and
 * written to `accountsFile`; an account whose password the file does not know gets a new one, so that the file is always right.
 */
export async function seedBase(accountsFile: string): Promise<SeedContext> {
  const known = await readDemoAccounts(accountsFile);
  const accounts: DemoAccount[] = [];
  const context = await inTransaction(async (transaction) => {
    const brackwaterId = await organisationNamed(BRACKWATER.name, transaction);
    const osterlodeId = await organisationNamed(OSTERLODE.name, transaction);
    const member = async (organisationId: string, organisation: string, person: Person) => {
      const { actor, password } = await account(organisationId, person, known, transaction);
      accounts.push({ ...person, password, organisation });
      return actor;
    };
    const inBrackwater = (person: Person) => member(brackwaterId, BRACKWATER.name, person);
    const { planner, integrator, admin, viewer } = BRACKWATER.people;
    return {
      brackwater: {
        organisationId: brackwaterId,
        planner: await inBrackwater(planner),
        integrator: await inBrackwater(integrator),
        admin: await inBrackwater(admin),
        viewer: await inBrackwater(viewer),
      },
      osterlode: {
        organisationId: osterlodeId,
        integrator: await member(osterlodeId, OSTERLODE.name, OSTERLODE.people.integrator),
      },
    };
  });
  await writeDemoAccounts(accountsFile, accounts);
  return context;
}

/** Lets the customer's account look at its project, once that has been made. */
export async function letViewerIn({ brackwater }: SeedContext): Promise<void> {
  const { organisationId, viewer } = brackwater;
  const project = await Project.findOne({ where: { organisationId, name: VIEWER_PROJECT }, rejectOnEmpty: true });
  const row = { projectId: project.id, membershipId: viewer.membershipId, organisationId };
  await ProjectViewer.findOrCreate({ where: row, defaults: row });
}

async function organisationNamed(name: string, transaction: Transaction): Promise<string> {
  const known = await Organisation.findOne({ where: { name }, transaction });
  if (!known) return (await createOrganisation(name, transaction)).id;
  await plantBuiltInArms(known.id, transaction);
  return known.id;
}

async function account(
  organisationId: string,
  person: Person,
  known: readonly DemoAccount[],
  transaction: Transaction,
): Promise<{ actor: MemberActor; password: string }> {
  const { email, name, role } = person;
  const password = known.find((entry) => entry.email === email)?.password ?? makePassword();
  let user = await User.findOne({ where: { email }, transaction });
  if (!user) user = await User.create({ email, name, passwordHash: await hashPassword(password) }, { transaction });
  else if (!(await verifyPassword(user.passwordHash, password))) {
    const sessionGeneration = user.sessionGeneration + 1;
    await user.update({ passwordHash: await hashPassword(password), sessionGeneration }, { transaction });
  }
  const membership = { userId: user.id, organisationId, role };
  const [{ id: membershipId }] = await Membership.findOrCreate({
    where: { userId: user.id },
    defaults: membership,
    transaction,
  });
  const projectIds = role === 'viewer' ? [] : null;
  return { actor: { kind: 'member', ...membership, membershipId, name, email, projectIds }, password };
}
