import type { Item } from '@/lib/layout/items';
import { noteBoxMm } from '@/lib/layout/note-lines';
import { boundsOfPoints } from '@/lib/layout/viewport';
import type { PointMm } from './ink';
import { walkwayEdges } from './items/lines';
import { robotSizes } from './robot-sticks';
import type { DrawnArm } from './types';

/** The box round an item in its own frame, mm; a robot's is a circle of radius `maxX`. */
export interface ItemFrame {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
  readonly round: boolean;
}

export function frameOfItem(item: Item, arms: ReadonlyMap<string, DrawnArm>): ItemFrame {
  if (item.kind === 'robot') {
    const radius = robotSizes(arms.get(item.armId)?.reachMm ?? 0).baseRadiusMm;
    return { minX: -radius, minY: -radius, maxX: radius, maxY: radius, round: true };
  }
  const bounds = boundsOfPoints(pointsOf(item)) ?? { minXMm: 0, minYMm: 0, maxXMm: 0, maxYMm: 0 };
  return { minX: bounds.minXMm, minY: bounds.minYMm, maxX: bounds.maxXMm, maxY: bounds.maxYMm, round: false };
}

function pointsOf(item: Exclude<Item, { kind: 'robot' }>): readonly PointMm[] {
  switch (item.kind) {
    case 'fixture':
    case 'obstacle':
    case 'zone':
      return item.outlineMm;
    case 'guardLine':
    case 'protectiveDevice':
      return item.pointsMm;
    case 'walkway':
    case 'conveyor':
      return walkwayEdges(item.pointsMm, item.widthMm).flat();
    case 'sectionLine':
      return [item.fromMm, item.toMm];
    case 'note':
      return noteBoxMm(item);
    case 'dimension': {
      const { fromMm, toMm, offsetMm } = item;
      const along = Math.atan2(toMm[1] - fromMm[1], toMm[0] - fromMm[0]) + Math.PI / 2;
      const off = [offsetMm * Math.cos(along), offsetMm * Math.sin(along)];
      return [fromMm, toMm, [fromMm[0] + off[0], fromMm[1] + off[1]], [toMm[0] + off[0], toMm[1] + off[1]]];
    }
  }
}
