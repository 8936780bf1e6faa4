import type { Transaction } from 'sequelize';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import { FloorPlan, Layout } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { letterFor } from '../layouts/create-layout';
import { layItems } from '../layouts/item-rows';
import { summaryOf } from '../layouts/read-layouts';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { findRevision } from './data';

/**
 * A new variant under the next letter with what the revision froze; the draft that it was issued from stays as it is. Items keep
 * their ids, so that remarks and task sequences still find them. A floor plan deleted since is left out.
 */
export async function restoreRevision(
  actor: MemberActor,
  revisionId: string,
  outer?: Transaction,
): Promise<LayoutSummary> {
  return inTransaction(async (transaction) => {
    const { snapshot, number, layout: source } = await findRevision(actor, revisionId, transaction);
    const project = await findProject(actor, source.projectId, transaction, { lock: true });
    const floorPlan = snapshot.floorPlan
      ? await FloorPlan.findOne({ where: { id: snapshot.floorPlan.id, projectId: project.id }, transaction })
      : null;
    const ending = `, from rev ${number}`;
    const layout = await Layout.create(
      {
        projectId: project.id,
        letter: await letterFor(project, transaction),
        name: `${snapshot.name.slice(0, 120 - ending.length)}${ending}`,
        floorPlanId: floorPlan?.id ?? null,
        mapSettings: snapshot.mapSettings,
        createdBy: actor.userId,
      },
      { transaction },
    );
    await layItems(layout.id, snapshot.items, transaction);
    await recordAudit(
      actor,
      { action: 'revision.restored', subjectId: revisionId, details: { layoutId: layout.id } },
      transaction,
    );
    return summaryOf(actor, layout, transaction);
  }, outer);
}
