import type Konva from 'konva';
import type { Item } from '@/lib/layout/items';
import { inkOf, pixelOf, traceCircle, tracePath, type PointMm } from './ink';
import { conveyorOutline } from './items/conveyor';
import { walkwayEdges } from './items/lines';
import { lettersOfNote } from './items/note';

/** How thick a line is to a pointer, px. */
const GRIP_PX = 14;
/** How large a body is at least to a pointer, px. */
const LEAST_BODY_PX = 10;

/** Where a press takes hold of an item: bodies as a whole, lines along themselves, never what they enclose. */
export function traceHit(context: Konva.Context, shape: Konva.Shape, item: Item, baseRadiusMm: number): void {
  const ink = inkOf(context);
  const px = pixelOf(shape);
  ink.fillStyle = shape.colorKey;
  ink.strokeStyle = shape.colorKey;
  ink.lineWidth = GRIP_PX * px;
  ink.lineJoin = 'round';
  const along = (points: readonly PointMm[], closed: boolean) => {
    tracePath(ink, points, closed);
    ink.stroke();
  };
  switch (item.kind) {
    case 'robot':
      traceCircle(ink, 0, 0, Math.max(baseRadiusMm, LEAST_BODY_PX * px));
      return ink.fill();
    case 'fixture':
    case 'obstacle':
      tracePath(ink, item.outlineMm, true);
      ink.lineWidth = 6 * px;
      ink.fill();
      ink.stroke();
      if (item.kind === 'fixture') {
        for (const { xMm, yMm } of item.taskPoints) {
          traceCircle(ink, xMm, yMm, LEAST_BODY_PX * px);
          ink.fill();
        }
      }
      return;
    case 'zone':
      return along(item.outlineMm, true);
    case 'protectiveDevice':
      return along(item.pointsMm, false);
    case 'guardLine':
      return along(item.pointsMm, item.closed);
    case 'walkway':
      walkwayEdges(item.pointsMm, item.widthMm).forEach((edge) => along(edge, false));
      return;
    case 'conveyor':
      tracePath(ink, conveyorOutline(item), true);
      ink.lineWidth = 6 * px;
      ink.fill();
      return ink.stroke();
    case 'sectionLine':
      return along([item.fromMm, item.toMm], false);
    case 'note': {
      const { widthMm, heightMm } = lettersOfNote(item, px);
      const slack = 4 * px;
      return ink.fillRect(-slack, -heightMm - slack, widthMm + 2 * slack, heightMm + 2 * slack);
    }
    case 'dimension': {
      const [[x1, y1], [x2, y2]] = [item.fromMm, item.toMm];
      const length = Math.hypot(x2 - x1, y2 - y1) || 1;
      const [nx, ny] = [(-(y2 - y1) / length) * item.offsetMm, ((x2 - x1) / length) * item.offsetMm];
      return along([[x1 + nx, y1 + ny], [x2 + nx, y2 + ny]], false); // prettier-ignore
    }
  }
}
