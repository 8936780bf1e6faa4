import { randomUUID } from 'node:crypto';
import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import type { Transaction } from 'sequelize';
import { REMARK_PICTURE_MAX_BYTES, REMARK_PICTURES_MAX, type Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import { RemarkPicture } from '@/models';
import { inTransaction } from '../database';
import { AppError, conflict, forbidden, notFound } from '../errors';
import { readUpload } from '../floor-plans/read-upload';
import { deleteObjects, getObject, putObject } from '../object-store';
import { turnstile } from '../turnstile';
import type { Reader } from './author';
import { findRemark } from './data';
import { isReader, presentRemark } from './present';

const TYPES = ['image/png', 'image/jpeg', 'image/webp'];
/** A phone's photograph has 12 to 50 million pixels; more would be a bomb. */
const MAX_PIXELS = 60_000_000;
const SHOWN_SIDE_PX = 2000;
const inTurn = turnstile(2);

const refusal = (status: number, code: string, detail: string): AppError =>
  new AppError({ status, code, detail, errors: [{ path: 'file', message: detail }] });

/** A WebP of our own making: told by its content, upright, without metadata such as where a photograph was taken. */
async function madeAnew(bytes: Uint8Array): Promise<{ data: Buffer; widthPx: number; heightPx: number }> {
  const found = await fileTypeFromBuffer(bytes);
  if (!found || !TYPES.includes(found.mime)) {
    throw refusal(415, 'file_type', 'This file is not a PNG, JPEG or WebP picture. Save it as one of them.');
  }
  try {
    const { data, info } = await inTurn(() =>
      sharp(bytes, { limitInputPixels: MAX_PIXELS, failOn: 'error' })
        .timeout({ seconds: 30 })
        .autoOrient()
        .resize({ width: SHOWN_SIDE_PX, height: SHOWN_SIDE_PX, fit: 'inside', withoutEnlargement: true })
        .toColourspace('srgb')
        .webp({ quality: 82 })
        .toBuffer({ resolveWithObject: true }),
    );
    return { data, widthPx: info.width, heightPx: info.height };
  } catch {
    const detail =
      'The picture is damaged, or has more than 60 million pixels. Save it again, smaller, and attach that.';
    throw refusal(422, 'picture_damaged', detail);
  }
}

/** Attaches a picture to one's own remark. Refused or failed, it leaves nothing behind. */
export async function attachPicture(
  reader: Reader,
  remarkId: string,
  request: Request,
  outer?: Transaction,
): Promise<RemarkAnswer> {
  const asked = await findRemark(reader.actor, remarkId, outer);
  if (!isReader(asked, reader)) throw forbidden('Pictures can be attached to your own remarks only.');
  const { bytes } = await readUpload(request, REMARK_PICTURE_MAX_BYTES);
  const { data, widthPx, heightPx } = await madeAnew(bytes);
  const objectKey = `remarks/${asked.revision.layout.project.organisationId}/${remarkId}/${randomUUID()}`;
  await putObject(objectKey, data, 'image/webp');
  try {
    return await inTransaction(async (transaction) => {
      // Holds the remark, so that two uploads at once count one another.
      await asked.reload({ transaction, lock: transaction.LOCK.UPDATE, include: [] });
      if ((await RemarkPicture.count({ where: { remarkId }, transaction })) >= REMARK_PICTURES_MAX) {
        throw conflict('pictures_full', `A remark holds ${REMARK_PICTURES_MAX} pictures. Pin another remark for more.`);
      }
      await RemarkPicture.create({ remarkId, objectKey, widthPx, heightPx }, { transaction });
      return presentRemark(await findRemark(reader.actor, remarkId, transaction), reader);
    }, outer);
  } catch (error) {
    await deleteObjects([objectKey]).catch(() => undefined);
    throw error;
  }
}

/** The picture, for whoever may read the remark. Throws not_found. */
export async function pictureResponse({ actor }: Reader, remarkId: string, pictureId: string): Promise<Response> {
  const remark = await findRemark(actor, remarkId);
  const picture = remark.pictures.find(({ id }) => id === pictureId);
  const object = picture && (await getObject(picture.objectKey));
  if (!object) throw notFound('picture');
  return new Response(object.body, {
    headers: {
      'content-type': 'image/webp',
      'content-length': String(object.body.byteLength),
      'content-disposition': 'inline',
      'x-content-type-options': 'nosniff',
      // Never changes under its id; nobody but this reader's browser keeps it.
      'cache-control': 'private, max-age=86400, immutable',
    },
  });
}
