import { AppError } from '../errors';

const number = new Intl.NumberFormat('en');

const refusal = (status: number, code: string, detail: string): AppError =>
  new AppError({ status, code, detail, errors: [{ path: 'file', message: detail }] });

/** What to do with the kinds of file that people try most often. */
const REMEDIES: Record<string, string> = {
  pdf: 'This is a PDF. Export the page as PNG (200 dpi will do) and upload that.',
  dwg: 'This is a CAD drawing. Export it as PNG and upload that.',
  heic: 'This is a HEIC photograph. Save it as JPEG and upload that.',
  gif: 'This is a GIF. Save it as PNG and upload that.',
  tif: 'This is a TIFF. Save it as PNG and upload that.',
  bmp: 'This is a bitmap (BMP). Save it as PNG and upload that.',
};

/** Every way in which an upload can be refused: what is wrong, and what to do. */
export const refuse = {
  missing: () => refusal(400, 'file_missing', 'No file came with the request. Choose a PNG, JPEG or WebP file.'),
  broken: () => refusal(400, 'upload_broken', 'The upload broke off. Check your connection and upload the file again.'),
  empty: () => refusal(400, 'file_empty', 'The file is empty (0 bytes). Save the floor plan again and upload it.'),
  tooManyBytes: (limitMb: number) =>
    refusal(
      413,
      'file_too_large',
      `The file is larger than ${limitMb} MB. Save it with fewer pixels, or as JPEG, and try again.`,
    ),
  type: (found: string | null) =>
    refusal(
      415,
      'file_type',
      (found && REMEDIES[found]) ??
        'This file is not a PNG, JPEG or WebP picture, whatever its name says. Export the floor plan as one of them.',
    ),
  tooManyPixels: (widthPx: number, heightPx: number) =>
    refusal(
      413,
      'picture_too_large',
      `The picture says it has ${number.format(widthPx)} × ${number.format(heightPx)} pixels; 50 million in all is the limit. ` +
        'Save it smaller and upload it again.',
    ),
  animated: () =>
    refusal(422, 'picture_animated', 'This picture is animated. Save one still frame of it and upload that.'),
  damaged: () =>
    refusal(
      422,
      'picture_damaged',
      'The picture is damaged or cut short. Open it on your computer, save it again and upload the new file.',
    ),
};
