import { randomUUID } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import sharp from 'sharp';
import type { LayoutFile } from '@/lib/contracts/layout-file';
import { FloorPlan } from '@/models';
import type { Transaction } from '../database';
import { AppError } from '../errors';
import { pictureKey } from '../floor-plans/keys';
import { readPicture, type Rendition } from '../floor-plans/read-picture';
import { putObject } from '../object-store';
import type { MemberActor } from '../policy';
import { sha256Of, wholePicture } from './layout-file';

type FilePlan = NonNullable<LayoutFile['floorPlan']>;

/** A floor plan out of a file, checked and ready to be stored. */
export interface PreparedPlan {
  readonly plan: FilePlan;
  readonly bytes: Uint8Array;
  readonly renditions: readonly Rendition[];
  readonly originalMediaType: FloorPlan['originalMediaType'];
}

const damaged = (path: string, detail: string): AppError =>
  new AppError({
    status: 422,
    code: 'file_damaged',
    detail,
    errors: [{ path: `floorPlan.${path}`, message: detail }],
  });

/** Decodes the picture and compares it with what the file says of it. Throws 422 with the place of the fault. */
export async function preparePlan(plan: FilePlan): Promise<PreparedPlan> {
  const bytes = Buffer.from(plan.picture.base64, 'base64');
  if (sha256Of(bytes) !== plan.picture.sha256) {
    throw damaged(
      'picture.sha256',
      'The floor plan in this file is damaged: its checksum does not fit. Export it again.',
    );
  }
  const picture = await readPicture(bytes);
  if (picture.mediaType !== plan.picture.mediaType)
    throw damaged('picture.mediaType', 'The floor plan in this file is not the kind of picture that the file says.');
  if (picture.widthPx !== plan.widthPx || picture.heightPx !== plan.heightPx)
    throw damaged('widthPx', 'The floor plan in this file has another size than the file says.');
  const renditions = [...picture.renditions];
  // The whole picture stays byte for byte, so that the next export is the same file; not where it carries more than pixels.
  if (await isBare(bytes)) {
    renditions[renditions.length - 1] = { widthPx: plan.widthPx, bytes, contentType: plan.picture.mediaType };
  }
  return { plan, bytes, renditions, originalMediaType: picture.mediaType };
}

async function isBare(bytes: Uint8Array): Promise<boolean> {
  const head = await sharp(bytes, { limitInputPixels: false }).metadata();
  return !head.exif && !head.xmp && !head.iptc && !head.icc && (head.orientation ?? 1) === 1;
}

/** The same plan where the project has it: same picture, same name, same scale. */
export async function knownPlan(
  projectId: string,
  { plan }: PreparedPlan,
  transaction?: Transaction,
): Promise<FloorPlan | null> {
  const { name, widthPx, heightPx } = plan;
  const rows = await FloorPlan.findAll({ where: { projectId, name, widthPx, heightPx }, transaction });
  for (const row of rows) {
    if (!isDeepStrictEqual(row.calibration ?? null, plan.calibration)) continue;
    const picture = await wholePicture(row);
    if (picture && sha256Of(picture.body) === plan.picture.sha256) return row;
  }
  return null;
}

/** Puts the pictures into the store; the row is made later by `addPlan`. */
export async function storePlan(
  actor: MemberActor,
  { renditions }: PreparedPlan,
): Promise<{ id: string; keys: string[] }> {
  const id = randomUUID();
  const prefix = `floor-plans/${actor.organisationId}/${id}`;
  const keys: string[] = [];
  for (const { widthPx, bytes, contentType } of renditions) {
    await putObject(pictureKey(prefix, widthPx), bytes, contentType);
    keys.push(pictureKey(prefix, widthPx));
  }
  return { id, keys };
}

export async function addPlan(
  actor: MemberActor,
  projectId: string,
  { plan, bytes, renditions, originalMediaType }: PreparedPlan,
  id: string,
  transaction: Transaction,
): Promise<FloorPlan> {
  const { name, widthPx, heightPx, calibration } = plan;
  return FloorPlan.create(
    {
      id,
      projectId,
      name,
      widthPx,
      heightPx,
      calibration,
      objectPrefix: `floor-plans/${actor.organisationId}/${id}`,
      originalMediaType,
      originalBytes: bytes.byteLength,
      pictureWidths: renditions.map((rendition) => rendition.widthPx),
      createdBy: actor.userId,
    },
    { transaction },
  );
}
