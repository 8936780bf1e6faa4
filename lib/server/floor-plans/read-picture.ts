import { fileTypeFromBuffer } from 'file-type';
import sharp, { type Metadata, type Sharp } from 'sharp';
import { FLOOR_PLAN_MAX_PIXELS } from '@/lib/contracts/floor-plans';
import { turnstile } from '../turnstile';
import { refuse } from './refusals';

export interface Rendition {
  readonly widthPx: number;
  readonly bytes: Uint8Array;
  readonly contentType: string;
}

export interface Picture {
  readonly mediaType: PictureType;
  /** Size of the upright picture. */
  readonly widthPx: number;
  readonly heightPx: number;
  /** Smallest first; the last one is the whole picture. */
  readonly renditions: readonly Rendition[];
}

const PICTURE_TYPES = ['image/png', 'image/jpeg', 'image/webp'] as const;
export type PictureType = (typeof PICTURE_TYPES)[number];

const DISPLAY_WIDTHS_PX = [1024, 2048, 4096];
/** The WebP format ends here. */
const WEBP_MAX_SIDE_PX = 16_383;
/** A file can be small and still take minutes to decode. */
const DECODE_LIMIT_SECONDS = 120;

/** A decoded plan takes up to 200 MB: a few at a time, however many people upload at once. */
const inTurn = turnstile(2);

async function pictureType(bytes: Uint8Array): Promise<PictureType> {
  const found = await fileTypeFromBuffer(bytes);
  if (found?.mime === 'image/apng') throw refuse.animated();
  const type = PICTURE_TYPES.find((candidate) => candidate === found?.mime);
  if (!type) throw refuse.type(found?.ext ?? null);
  return type;
}

/** Reads the head of the file only, so what it declares is refused before a pixel of it is decoded. */
async function checkedHead(bytes: Uint8Array): Promise<Metadata> {
  let head: Metadata;
  try {
    head = await sharp(bytes, { limitInputPixels: false }).metadata();
  } catch {
    throw refuse.damaged();
  }
  if (head.width * head.height > FLOOR_PLAN_MAX_PIXELS) throw refuse.tooManyPixels(head.width, head.height);
  if ((head.pages ?? 1) > 1) throw refuse.animated();
  return head;
}

/** The whole picture: exact pixels for drawings, a fine WebP for photographs and scans. */
function whole(picture: Sharp, type: PictureType, { width, height }: { width: number; height: number }): Sharp {
  const lossy = type === 'image/jpeg' && Math.max(width, height) <= WEBP_MAX_SIDE_PX;
  return lossy ? picture.webp({ quality: 92, effort: 2 }) : picture.png({ compressionLevel: 6 });
}

async function rendition(picture: Sharp): Promise<Rendition> {
  try {
    const { data, info } = await picture.toBuffer({ resolveWithObject: true });
    return { widthPx: info.width, bytes: data, contentType: `image/${info.format}` };
  } catch {
    throw refuse.damaged();
  }
}

/**
 * Turns an uploaded file into pictures of our own making: told by its content and not its name, upright (EXIF orientation
 * applied), sRGB, free of metadata. Throws AppError: `file_type` (415), `picture_too_large` (413), `picture_animated` and
 * `picture_damaged` (422).
 */
export async function readPicture(bytes: Uint8Array): Promise<Picture> {
  const mediaType = await pictureType(bytes);
  const { autoOrient: upright } = await checkedHead(bytes);
  return inTurn(async () => {
    const source = sharp(bytes, { limitInputPixels: FLOOR_PLAN_MAX_PIXELS, failOn: 'error' })
      .timeout({ seconds: DECODE_LIMIT_SECONDS })
      .autoOrient()
      .toColourspace('srgb');
    const renditions: Rendition[] = [];
    for (const width of DISPLAY_WIDTHS_PX.filter((candidate) => candidate < upright.width)) {
      const height = Math.max(1, Math.round((upright.height * width) / upright.width));
      if (height > WEBP_MAX_SIDE_PX) continue;
      renditions.push(await rendition(source.clone().resize({ width, height, fit: 'fill' }).webp({ quality: 90 })));
    }
    renditions.push(await rendition(whole(source.clone(), mediaType, upright)));
    return { mediaType, widthPx: upright.width, heightPx: upright.height, renditions };
  });
}
