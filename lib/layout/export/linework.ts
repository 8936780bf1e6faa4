import { settledItems } from '../attached-dimensions';
import type { Item } from '../items';
import { deviceShapes, guardShapes, walkwayShapes } from './line-shapes';
import { dimensionShapes, noteShapes, sectionShapes } from './mark-shapes';
import { robotShapes } from './robot-shapes';
import type { DrawnRobot, Shape } from './shapes';
import { conveyorShapes, fixtureShapes, obstacleShapes, zoneShapes } from './solid-shapes';

export * from './shapes';

/** Every line of the items that are not hidden, the lowest first; attached dimensions follow their items. */
export function linework(items: readonly Item[], robots: ReadonlyMap<string, DrawnRobot>): Shape[] {
  return settledItems(items)
    .filter(({ hidden }) => !hidden)
    .flatMap((item) => shapesOf(item, robots.get(item.id)));
}

function shapesOf(item: Item, robot: DrawnRobot | undefined): Shape[] {
  switch (item.kind) {
    case 'robot':
      return robotShapes(item, robot);
    case 'fixture':
      return fixtureShapes(item);
    case 'obstacle':
      return obstacleShapes(item);
    case 'guardLine':
      return guardShapes(item);
    case 'walkway':
      return walkwayShapes(item);
    case 'conveyor':
      return conveyorShapes(item);
    case 'dimension':
      return dimensionShapes(item);
    case 'sectionLine':
      return sectionShapes(item);
    case 'note':
      return noteShapes(item);
    case 'zone':
      return zoneShapes(item);
    case 'protectiveDevice':
      return deviceShapes(item);
  }
}
