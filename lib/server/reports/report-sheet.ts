import sharp from 'sharp';
import type { ReportedSheet, ReportOptions } from '@/lib/contracts/reports';
import { drawnSheet, type DrawnSheet } from '@/lib/layout/export/drawn-sheet';
import { composeFloorMap, floorGridOf, type FloorMap } from '@/lib/layout/floor-map';
import { floorFigures, verdictFigures } from '@/lib/layout/verdict-figures';
import { guardedAreaM2, type SheetFigures } from '@/lib/layout/compared-figures';
import { FloorPlan } from '@/models';
import { placedMapsOf } from '../exports/placed-maps';
import { pictureKey, widthAtHand } from '../floor-plans/keys';
import { getObject } from '../object-store';
import type { Picture } from './pen/pen';

/** A sheet with everything that its pages draw, worked out once. */
export interface ReportSheet extends ReportedSheet, DrawnSheet {
  readonly map: FloorMap | null;
  /** Robots whose map is in `map`, by its index. */
  readonly mapRobotIds: readonly string[];
  readonly threshold: number | null;
  readonly figures: SheetFigures;
  readonly picture: Picture | null;
}

/** Wide enough for an A3 page at 200 dots an inch. */
const PICTURE_WIDTH_PX = 4096;

export async function reportSheet(
  sheet: ReportedSheet,
  organisationId: string,
  options: ReportOptions,
): Promise<ReportSheet> {
  const { snapshot } = sheet;
  const { items, arms, mapSettings } = snapshot;
  const drawn = drawnSheet(items, arms, mapSettings.wrist);
  const placed = await placedMapsOf(snapshot, organisationId);
  const grid = floorGridOf(placed, mapSettings.stepMm);
  const map = grid && composeFloorMap(grid, placed, mapSettings.measure);
  const threshold = mapSettings.measure === 'reach' ? null : mapSettings.thresholds[mapSettings.measure];
  return {
    ...sheet,
    ...drawn,
    map,
    mapRobotIds: placed.map(({ robotId }) => robotId),
    threshold,
    figures: {
      verdicts: verdictFigures(drawn.verdicts),
      floor: map && floorFigures(map, threshold),
      guardedM2: guardedAreaM2(items),
    },
    picture: options.floorPlan ? await floorPicture(sheet) : null,
  };
}

/** The floor plan's picture in a format that a PDF can hold; null where there is none or it is not set to scale. */
async function floorPicture({ snapshot: { floorPlan } }: ReportedSheet): Promise<Picture | null> {
  if (!floorPlan?.calibration) return null;
  const row = await FloorPlan.findByPk(floorPlan.id);
  const object =
    row && (await getObject(pictureKey(row.objectPrefix, widthAtHand(row.pictureWidths, PICTURE_WIDTH_PX))));
  if (!object) return null;
  const { data, info } = await sharp(object.body)
    .flatten({ background: '#ffffff' })
    .resize({ width: PICTURE_WIDTH_PX, withoutEnlargement: true })
    .jpeg({ quality: 88 })
    .toBuffer({ resolveWithObject: true });
  return { bytes: data, mediaType: 'image/jpeg', widthPx: info.width, heightPx: info.height };
}
