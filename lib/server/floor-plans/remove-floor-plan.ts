import type { FloorPlan } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { deleteObjects } from '../object-store';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { findFloorPlan, usesOf } from './data';
import { pictureKeysOf } from './keys';

function refuseUsed({ letters, issued }: { letters: string[]; issued: boolean }): void {
  if (letters.length > 0) {
    const where = letters.length === 1 ? `variant ${letters[0]}` : `variants ${letters.join(', ')}`;
    throw conflict(
      'floor_plan_in_use',
      `This floor plan lies under ${where}. Choose another floor plan there first, then delete this one.`,
    );
  }
  if (issued) {
    throw conflict('floor_plan_in_use', 'An issued revision shows this floor plan, so it is kept for good.');
  }
}

/** Deletes a floor plan that no variant and no issued revision uses, then its pictures. */
export async function removeFloorPlan(actor: MemberActor, floorPlanId: string): Promise<void> {
  const removed = await inTransaction(async (transaction): Promise<FloorPlan> => {
    const { projectId } = await findFloorPlan(actor, floorPlanId, transaction);
    // Whoever puts a plan under a variant holds the project too, so the answer cannot change before the delete.
    await findProject(actor, projectId, transaction, { lock: true });
    const floorPlan = await findFloorPlan(actor, floorPlanId, transaction, { lock: true });
    refuseUsed(await usesOf(floorPlan, transaction));
    await floorPlan.destroy({ transaction });
    const details = { name: floorPlan.name };
    await recordAudit(actor, { action: 'floor_plan.removed', subjectId: floorPlanId, details }, transaction);
    return floorPlan;
  });
  // Only once the row is gone for good: a rollback must find its pictures where they were.
  await deleteObjects(pictureKeysOf(removed));
}
