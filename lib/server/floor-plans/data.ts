import { literal, Op, QueryTypes, type Transaction, type WhereOptions } from 'sequelize';
import { FloorPlan, Layout, Project } from '@/models';
import { sequelize } from '../database';
import { notFound } from '../errors';
import { projectScope, seesDrafts, type Actor } from '../policy';

/**
 * Where `floor_plans` may be seen: every plan of a project, or (viewers and guests) only what lies under an issued revision,
 * and for a guest under the one revision shared.
 */
function pictureScope(actor: Actor): WhereOptions<FloorPlan> {
  if (seesDrafts(actor)) return {};
  const one = actor.kind === 'share' ? `AND revisions.id = ${sequelize.escape(actor.revisionId)}` : '';
  return literal(`EXISTS (
    SELECT 1 FROM revisions JOIN layouts ON layouts.id = revisions.layout_id
    WHERE layouts.project_id = "FloorPlan".project_id
      AND revisions.snapshot #>> '{floorPlan,id}' = "FloorPlan".id::text ${one})`);
}

/** The floor plan if the actor may see it, for reading or (with `lock`) held until the transaction ends. Throws not_found. */
export async function findFloorPlan(
  actor: Actor,
  floorPlanId: string,
  transaction?: Transaction,
  { lock = false }: { lock?: boolean } = {},
): Promise<FloorPlan> {
  const floorPlan = await FloorPlan.findOne({
    where: { [Op.and]: [{ id: floorPlanId }, pictureScope(actor)] },
    include: [{ model: Project, as: 'project', where: projectScope(actor), attributes: [], required: true }],
    transaction,
    ...(lock && transaction ? { lock: { level: transaction.LOCK.UPDATE, of: FloorPlan } } : {}),
  });
  if (!floorPlan) throw notFound('floor plan');
  return floorPlan;
}

/** All floor plans of a project that the caller has already been let at, oldest first. */
export async function floorPlansOf(project: Project, transaction?: Transaction): Promise<FloorPlan[]> {
  return FloorPlan.findAll({
    where: { projectId: project.id },
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
}

/** Letters of the variants that the plan lies under, and whether an issued revision shows it. */
export async function usesOf(
  floorPlan: FloorPlan,
  transaction?: Transaction,
): Promise<{ letters: string[]; issued: boolean }> {
  const layouts = await Layout.findAll({
    where: { floorPlanId: floorPlan.id },
    attributes: ['letter'],
    order: ['letter'],
    transaction,
  });
  const [{ issued }] = await sequelize.query<{ issued: boolean }>(
    `SELECT EXISTS (
       SELECT 1 FROM revisions JOIN layouts ON layouts.id = revisions.layout_id
       WHERE layouts.project_id = :projectId AND revisions.snapshot #>> '{floorPlan,id}' = :floorPlanId) AS issued`,
    {
      replacements: { projectId: floorPlan.projectId, floorPlanId: floorPlan.id },
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  return { letters: layouts.map(({ letter }) => letter), issued };
}
