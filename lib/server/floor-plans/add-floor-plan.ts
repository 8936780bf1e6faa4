import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { FloorPlan } from '@/models';
import type { FloorPlan as FloorPlanAnswer } from '@/lib/contracts/floor-plans';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { deleteObjects, putObject } from '../object-store';
import type { MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { pictureKey } from './keys';
import { presentFloorPlan } from './present';
import { readPicture, type Picture } from './read-picture';
import type { Upload } from './read-upload';

/** Stores every rendition, or none of them. */
async function storePictures(prefix: string, { renditions }: Picture): Promise<string[]> {
  const keys = renditions.map(({ widthPx }) => pictureKey(prefix, widthPx));
  try {
    for (const [index, { bytes, contentType }] of renditions.entries()) {
      await putObject(keys[index], bytes, contentType);
    }
  } catch (error) {
    await deleteObjects(keys).catch(() => undefined);
    throw error;
  }
  return keys;
}

/**
 * Takes an uploaded picture in as a floor plan of the project. A picture that is refused (see readPicture) or a database that
 * fails leaves nothing behind, neither a row nor an object.
 */
export async function addFloorPlan(
  actor: MemberActor,
  projectId: string,
  { bytes, name }: Upload,
  outer?: Transaction,
): Promise<FloorPlanAnswer> {
  const project = await findProject(actor, projectId, outer);
  const picture = await readPicture(bytes);
  const id = randomUUID();
  const objectPrefix = `floor-plans/${project.organisationId}/${id}`;
  const keys = await storePictures(objectPrefix, picture);
  try {
    const floorPlan = await inTransaction(async (transaction) => {
      await recordAudit(actor, { action: 'floor_plan.added', subjectId: id, details: { name } }, transaction);
      return FloorPlan.create(
        {
          id,
          projectId,
          name,
          widthPx: picture.widthPx,
          heightPx: picture.heightPx,
          objectPrefix,
          originalMediaType: picture.mediaType,
          originalBytes: bytes.byteLength,
          pictureWidths: picture.renditions.map(({ widthPx }) => widthPx),
          createdBy: actor.userId,
        },
        { transaction },
      );
    }, outer);
    return presentFloorPlan(floorPlan);
  } catch (error) {
    await deleteObjects(keys).catch(() => undefined);
    throw error;
  }
}
