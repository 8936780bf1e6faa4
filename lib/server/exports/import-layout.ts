import { isDeepStrictEqual } from 'node:util';
import type { LayoutFile, LayoutImportAnswer } from '@/lib/contracts/layout-file';
import { Arm, Layout } from '@/models';
import { createArm } from '../arms/create-arm';
import { recordAudit } from '../audit';
import { inTransaction, type Transaction } from '../database';
import { AppError } from '../errors';
import { createLayout } from '../layouts/create-layout';
import { layItems } from '../layouts/item-rows';
import { deleteObjects } from '../object-store';
import { actsAs, demandRole, type MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { contentOfArm, withArms } from './file-arms';
import { addPlan, knownPlan, preparePlan, storePlan, type PreparedPlan } from './import-floor-plan';
import { readLayoutFile } from './read-layout-file';

/**
 * A layout file as a new variant of the project, with its floor plan and its arms where they are not there yet. All of it or nothing.
 * @throws 422 for a file that cannot be read (see readLayoutFile), 403 `arms_missing` where a planner brings arms that only an
 * integrator may add to the library.
 */
export async function importLayout(
  actor: MemberActor,
  projectId: string,
  bytes: Uint8Array,
): Promise<LayoutImportAnswer> {
  demandRole(actor, 'planner');
  await findProject(actor, projectId);
  const file = readLayoutFile(bytes);
  const prepared = file.floorPlan && (await preparePlan(file.floorPlan));
  const known = prepared && (await knownPlan(projectId, prepared));
  const stored = prepared && !known ? await storePlan(actor, prepared) : null;
  try {
    return await inTransaction((transaction) =>
      insert(actor, projectId, file, { prepared, knownId: known?.id ?? null, newId: stored?.id ?? null }, transaction),
    );
  } catch (error) {
    if (stored) await deleteObjects(stored.keys).catch(() => undefined);
    throw error;
  }
}

interface PlanOfFile {
  readonly prepared: PreparedPlan | null;
  readonly knownId: string | null;
  readonly newId: string | null;
}

async function insert(
  actor: MemberActor,
  projectId: string,
  file: LayoutFile,
  { prepared, knownId, newId }: PlanOfFile,
  transaction: Transaction,
): Promise<LayoutImportAnswer> {
  const { armIds, added } = await takeArms(actor, file, transaction);
  const summary = await createLayout(actor, projectId, { name: file.name, copyOf: null }, transaction);
  if (prepared && newId) await addPlan(actor, projectId, prepared, newId, transaction);
  const floorPlanId = knownId ?? newId;
  await Layout.update({ mapSettings: file.mapSettings, floorPlanId }, { where: { id: summary.id }, transaction });
  await layItems(summary.id, withArms(file.items, armIds), transaction);
  const details = { letter: summary.letter, name: file.name, items: file.items.length };
  await recordAudit(actor, { action: 'layout.imported', subjectId: summary.id, details }, transaction);
  return {
    layoutId: summary.id,
    letter: summary.letter,
    name: file.name,
    armsAdded: added,
    floorPlan: knownId ? 'found' : newId ? 'added' : null,
  };
}

/** Library ids for the arms of the file; an arm is known again by its content, whatever its id. */
async function takeArms(
  actor: MemberActor,
  { arms }: LayoutFile,
  transaction: Transaction,
): Promise<{ armIds: Map<string, string>; added: string[] }> {
  const where = { organisationId: actor.organisationId, name: arms.map(({ name }) => name) };
  const library = arms.length === 0 ? [] : await Arm.findAll({ where, order: [['version', 'DESC']], transaction });
  const armIds = new Map<string, string>();
  const missing = arms.filter((arm) => {
    const same = library.find((row) => isDeepStrictEqual(plainContent(row), plainContent(arm)));
    if (same) armIds.set(arm.id, same.id);
    return !same;
  });
  if (missing.length > 0 && !actsAs(actor, 'integrator')) throw armsMissing(arms, missing);
  for (const arm of missing) armIds.set(arm.id, (await createArm(actor, contentOfArm(arm), transaction)).id);
  return { armIds, added: missing.map(({ name }) => name) };
}

const plainContent = (arm: Parameters<typeof contentOfArm>[0]): unknown =>
  JSON.parse(JSON.stringify(contentOfArm(arm)));

function armsMissing(arms: LayoutFile['arms'], missing: LayoutFile['arms']): AppError {
  const names = missing.map(({ name }) => name).join(', ');
  return new AppError({
    status: 403,
    code: 'arms_missing',
    detail: `Your library lacks arms of this file: ${names}. Ask an integrator to import it. Nothing was changed.`,
    errors: missing.map((arm) => ({
      path: `arms.${arms.indexOf(arm)}`,
      message: `${arm.name} is not in your library.`,
    })),
  });
}
