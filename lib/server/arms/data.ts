import { literal, Op } from 'sequelize';
import type { FindAttributeOptions } from 'sequelize';
import type { ArmListQuery, LibraryArm } from '@/lib/contracts/arms';
import { Arm } from '@/models';
import type { Transaction } from '../database';
import { notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { presentArm } from './present';

/** Computed beside the columns: whether a newer version exists, and in how many layouts this version stands. */
const attributes: FindAttributeOptions = {
  include: [
    [
      literal('NOT EXISTS (SELECT 1 FROM arms n WHERE n.family_id = "Arm".family_id AND n.version > "Arm".version)'),
      'latest',
    ],
    [
      literal(`(SELECT count(DISTINCT i.layout_id)::int FROM items i
        WHERE i.data ->> 'armId' = "Arm".id::text AND i.kind = 'robot' AND i.removed_at IS NULL)`),
      'layoutCount',
    ],
  ],
};

/** Every version of every arm on one shelf, by name, newest first. Viewers find the arms of a revision in its snapshot. */
export async function listArms(
  actor: Actor,
  { archived }: ArmListQuery = { archived: 'false' },
  transaction?: Transaction,
): Promise<LibraryArm[]> {
  demandRole(actor, 'planner');
  const arms = await Arm.findAll({
    attributes,
    where: {
      organisationId: actor.organisationId,
      archivedAt: archived === 'true' ? { [Op.not]: null } : null,
    },
    order: [
      ['name', 'ASC'],
      ['familyId', 'ASC'],
      ['version', 'DESC'],
    ],
    transaction,
  });
  return arms.map(presentArm);
}

/** Throws 404 for an arm of another organisation. */
export async function getArm(actor: Actor, armId: string, transaction?: Transaction): Promise<LibraryArm> {
  demandRole(actor, 'planner');
  const where = { id: armId, organisationId: actor.organisationId };
  const arm = await Arm.findOne({ attributes, where, transaction });
  if (!arm) throw notFound('arm');
  return presentArm(arm);
}

/** All versions of the arm that `armId` is a version of, newest first. Throws 404 for an arm of another organisation. */
export async function listArmVersions(actor: Actor, armId: string, transaction?: Transaction): Promise<LibraryArm[]> {
  const { familyId } = await getArm(actor, armId, transaction);
  const where = { organisationId: actor.organisationId, familyId };
  const arms = await Arm.findAll({ attributes, where, order: [['version', 'DESC']], transaction });
  return arms.map(presentArm);
}

/**
 * Holds the arm that `armId` is a version of until the transaction ends, and gives its newest version. The first version is the
 * one that is locked: it is always there, so that two who save at once wait for each other. Throws 404.
 */
export async function holdNewest(actor: Actor, armId: string, transaction: Transaction): Promise<LibraryArm> {
  const { familyId } = await getArm(actor, armId, transaction);
  const where = { organisationId: actor.organisationId, familyId };
  await Arm.findOne({ where, order: [['version', 'ASC']], lock: transaction.LOCK.UPDATE, transaction });
  // Asked again behind the lock: a version saved while waiting is seen here.
  const newest = await Arm.findOne({ attributes, where, order: [['version', 'DESC']], transaction });
  if (!newest) throw notFound('arm');
  return presentArm(newest);
}

/**
 * The arm versions with these ids that the organisation owns; unknown ids are left out. For callers that have already shown
 * their right to something that names the arms (a layout, a revision).
 */
export async function armsByIds(
  organisationId: string,
  armIds: readonly string[],
  transaction?: Transaction,
): Promise<LibraryArm[]> {
  if (armIds.length === 0) return [];
  const where = { organisationId, id: [...new Set(armIds)] };
  const arms = await Arm.findAll({
    attributes,
    where,
    order: [
      ['name', 'ASC'],
      ['version', 'ASC'],
    ],
    transaction,
  });
  return arms.map(presentArm);
}
