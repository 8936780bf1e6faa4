import type { Transaction } from 'sequelize';
import { FloorPlan } from '@/models';
import type { LayoutChange, LayoutSummary } from '@/lib/contracts/layouts';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { invalid } from '../errors';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { findLayout } from './data';
import { summaryOf } from './read-layouts';

/** Renames a variant, lays a floor plan of its project under it, or asks another question of the maps. */
export async function changeLayout(
  actor: MemberActor,
  layoutId: string,
  { name, floorPlanId, mapSettings }: LayoutChange,
  outer?: Transaction,
): Promise<LayoutSummary> {
  return inTransaction(async (transaction) => {
    if (floorPlanId) {
      const { projectId } = await findLayout(actor, layoutId, transaction);
      // Held first, as the delete of a floor plan does: the plan cannot go while it is laid under a variant.
      await findProject(actor, projectId, transaction, { lock: true });
      const floorPlan = await FloorPlan.findOne({ where: { id: floorPlanId, projectId }, transaction });
      if (!floorPlan) throw invalid('floorPlanId', 'This floor plan is not in this project. Choose another one.');
    }
    const layout = await findLayout(actor, layoutId, transaction, { lock: true });
    if (name !== undefined) layout.name = name;
    if (floorPlanId !== undefined) layout.floorPlanId = floorPlanId;
    if (mapSettings !== undefined) layout.mapSettings = mapSettings;
    await layout.save({ transaction });
    const details = {
      ...(name !== undefined && { name }),
      ...(floorPlanId !== undefined && { floorPlanId }),
      ...(mapSettings !== undefined && { mapQuestion: true }),
    };
    await recordAudit(actor, { action: 'layout.changed', subjectId: layoutId, details }, transaction);
    return summaryOf(actor, layout, transaction);
  }, outer);
}
