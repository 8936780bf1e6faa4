import { z } from 'zod';
import { calibrationSchema } from '@/lib/layout/calibration';
import { itemSchema } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { armContentSchema } from './arms';

/**
 * A whole layout as a file: what `Export as JSON` writes and `Import` reads. Everything that the file names is in it, so it can be
 * taken into any project of any organisation; nothing in it says where or when it was written, so one layout has one spelling.
 */
export const LAYOUT_FILE_FORMAT = 'elbowroom-layout';
/** Raised when a reader of the old number would misread the new file. */
export const LAYOUT_FILE_VERSION = 1;
export const LAYOUT_FILE_MAX_BYTES = 64 * 1024 * 1024;

const sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'A SHA-256 has 64 hexadecimal digits.');

/** An arm of the file; `id` is made from the content, so it is the same wherever the arm was exported. */
export const fileArmSchema = armContentSchema.extend({ id: z.uuid() });

/** The floor plan under the layout with its picture, PNG or WebP in base64. */
export const fileFloorPlanSchema = z.object({
  name: z.string().trim().min(1).max(120),
  widthPx: z.number().int().min(1).max(200_000),
  heightPx: z.number().int().min(1).max(200_000),
  calibration: calibrationSchema.nullable(),
  picture: z.object({
    mediaType: z.enum(['image/png', 'image/webp']),
    sha256,
    base64: z.base64(),
  }),
});

export const layoutFileSchema = z.object({
  format: z.literal(LAYOUT_FILE_FORMAT),
  version: z.literal(LAYOUT_FILE_VERSION),
  /**
   * Over the canonical JSON (keys sorted, no blanks) of all other members. A reader that finds it and counts another one refuses the
   * file; a file written by hand may leave it out.
   */
  sha256: sha256.optional(),
  name: z.string().trim().min(1, 'Give the variant a name.').max(120),
  mapSettings: mapSettingsSchema,
  arms: z.array(fileArmSchema).max(500),
  floorPlan: fileFloorPlanSchema.nullable(),
  /** In drawing order, the lowest first; `armId` of a robot names an arm of this file. */
  items: z.array(itemSchema).max(5000, 'A sheet holds at most 5,000 items.'),
});
export type LayoutFile = z.infer<typeof layoutFileSchema>;

/** The public JSON Schema (draft 2020-12) of the file. */
export function layoutFileJsonSchema(): Record<string, unknown> {
  return {
    ...z.toJSONSchema(layoutFileSchema, { io: 'input', unrepresentable: 'any' }),
    title: 'Elbowroom layout file',
    description:
      'Lengths in millimetres, angles in degrees, counter-clockwise; floor frame: x right, y away, z up. Points of outlines and lines ' +
      "are in the item's own frame. Arms follow the lengths in metres and angles in radians of their own definition.",
  };
}

/** POST /api/projects/[projectId]/import: the file as the body; the answer is the new variant. */
export const layoutImportAnswerSchema = z.object({
  layoutId: z.uuid(),
  letter: z.string(),
  name: z.string(),
  /** Arms that were new to the library. */
  armsAdded: z.array(z.string()),
  /** Whether the floor plan came out of the file or was there already; null where the file has none. */
  floorPlan: z.enum(['added', 'found']).nullable(),
});
export type LayoutImportAnswer = z.infer<typeof layoutImportAnswerSchema>;
