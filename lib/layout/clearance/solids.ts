import { itemToFloor, polygonAreaMm2, type PointMm } from '../geometry';
import type { Item } from '../items';
import { walkwayEdges } from '../walkway-edges';
import { sidesOf } from './plane';
import { makePrism, type Prism } from './prism';

/** Something of the sheet that a link may hit. */
export interface Solid {
  readonly itemId: string;
  readonly name: string;
  readonly prism: Prism;
}

/** Half the thickness that a guard line is taken with, mm. */
const GUARD_HALF_MM = 25;

/** Fixtures, obstacles, conveyors and guard lines as bodies; what is hidden does not stand there. */
export function solidsOf(items: readonly Item[]): Solid[] {
  return items
    .filter(({ hidden }) => !hidden)
    .flatMap((item) =>
      bodiesOf(item).map(({ outline, zFromMm, zToMm }) => ({
        itemId: item.id,
        name: item.name,
        prism: makePrism(
          outline.map((point) => itemToFloor(item, point)),
          zFromMm,
          zToMm,
        ),
      })),
    );
}

interface Body {
  readonly outline: readonly PointMm[];
  readonly zFromMm: number;
  readonly zToMm: number;
}

function bodiesOf(item: Item): Body[] {
  switch (item.kind) {
    case 'fixture':
    case 'obstacle':
      return [{ outline: item.outlineMm, zFromMm: item.zFromMm, zToMm: item.zToMm }];
    case 'conveyor':
      return strips(item.pointsMm, item.widthMm / 2, false, item.zFromMm, item.zToMm);
    case 'guardLine':
      return strips(item.pointsMm, GUARD_HALF_MM, item.closed, 0, item.heightMm);
    default:
      return [];
  }
}

function strips(points: readonly PointMm[], halfMm: number, closed: boolean, zFromMm: number, zToMm: number): Body[] {
  return sidesOf(points, closed)
    .map(([from, to]) => {
      const [left, right] = walkwayEdges([from, to], 2 * halfMm);
      return [...left, ...right.reverse()];
    })
    .filter((outline) => polygonAreaMm2(outline) > 0)
    .map((outline) => ({ outline, zFromMm, zToMm }));
}
