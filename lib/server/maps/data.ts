import { literal, Op, type Transaction } from 'sequelize';
import { DexterityMap, Layout, Project, Revision } from '@/models';
import { sequelize } from '../database';
import { notFound } from '../errors';
import { demandRole, projectScope, seesDrafts, type Actor } from '../policy';

/**
 * A map that the actor may see. Planners see every map of their organisation; viewers and share links those that a revision
 * open to them names.
 * @throws 404 otherwise.
 */
export async function findMap(actor: Actor, mapId: string, transaction?: Transaction): Promise<DexterityMap> {
  const map = await DexterityMap.findOne({ where: { id: mapId, organisationId: actor.organisationId }, transaction });
  if (!map || !(seesDrafts(actor) || (await isNamedInRevision(actor, mapId, transaction)))) throw notFound('map');
  return map;
}

async function isNamedInRevision(actor: Actor, mapId: string, transaction?: Transaction): Promise<boolean> {
  const named = sequelize.escape(JSON.stringify([{ mapId }]));
  const revision = await Revision.findOne({
    attributes: ['id'],
    where: {
      [Op.and]: [
        literal(`"Revision"."snapshot" -> 'maps' @> ${named}::jsonb`),
        ...(actor.kind === 'share' ? [{ id: actor.revisionId }] : []),
      ],
    },
    include: [
      {
        model: Layout,
        as: 'layout',
        attributes: [],
        required: true,
        include: [{ model: Project, as: 'project', attributes: [], required: true, where: projectScope(actor) }],
      },
    ],
    transaction,
  });
  return revision !== null;
}

/** The same map, held against every other change until the transaction ends; for those who may change maps. */
export async function lockMap(actor: Actor, mapId: string, transaction: Transaction): Promise<DexterityMap> {
  demandRole(actor, 'planner');
  const map = await DexterityMap.findOne({
    where: { id: mapId, organisationId: actor.organisationId },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (!map) throw notFound('map');
  return map;
}
