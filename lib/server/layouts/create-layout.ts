import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { Layout, type Project } from '@/models';
import type { LayoutRequest, LayoutSummary } from '@/lib/contracts/layouts';
import { withFreshIds } from '@/lib/layout/fresh-ids';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict, invalid } from '../errors';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { storedItemsOf } from './data';
import { layItems } from './item-rows';
import { nextLetter } from './letters';
import { summaryOf } from './read-layouts';

export async function letterFor(project: Project, transaction: Transaction): Promise<string> {
  const given = await Layout.findAll({ where: { projectId: project.id }, attributes: ['letter'], transaction });
  const letter = nextLetter(given.map((layout) => layout.letter));
  if (letter === null)
    throw conflict('letters_used_up', 'This project has all the variants it can have. Start a new project.');
  return letter;
}

async function modelLayout(project: Project, layoutId: string, transaction: Transaction): Promise<Layout> {
  const model = await Layout.findOne({
    where: { id: layoutId, projectId: project.id },
    // Shared is enough: nobody may edit the model halfway through the copy.
    lock: transaction.LOCK.SHARE,
    transaction,
  });
  if (!model) throw invalid('copyOf', 'The variant to copy is not in this project. Choose another one.');
  return model;
}

async function copyItems(model: Layout, layout: Layout, transaction: Transaction): Promise<void> {
  // Items and their parts have ids of their own in every variant; what points to another item points to its copy.
  const originals = (await storedItemsOf(model.id, transaction)).map(({ item }) => item);
  await layItems(layout.id, withFreshIds(originals, randomUUID), transaction);
}

/** A new variant under the next free letter, empty or with the items, floor plan and map settings of another one. */
export async function createLayout(
  actor: MemberActor,
  projectId: string,
  { name, copyOf }: LayoutRequest,
  outer?: Transaction,
): Promise<LayoutSummary> {
  return inTransaction(async (transaction) => {
    // Two who ask at the same moment get two letters: the project is held until the row is there.
    const project = await findProject(actor, projectId, transaction, { lock: true });
    const model = copyOf === null ? null : await modelLayout(project, copyOf, transaction);
    const layout = await Layout.create(
      {
        projectId: project.id,
        letter: await letterFor(project, transaction),
        name,
        floorPlanId: model?.floorPlanId ?? null,
        mapSettings: model?.mapSettings ?? mapSettingsSchema.parse({}),
        createdBy: actor.userId,
      },
      { transaction },
    );
    if (model) await copyItems(model, layout, transaction);
    const details = { letter: layout.letter, name, ...(copyOf && { copyOf }) };
    await recordAudit(actor, { action: 'layout.created', subjectId: layout.id, details }, transaction);
    return summaryOf(actor, layout, transaction);
  }, outer);
}
