import { makeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { MapTile } from '@/lib/kinematics/types';
import type { MapSettings } from './map-settings';

const VALUES = ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'limitShare', 'wristCoverage'] as const;

/** The heights whose maps a sheet asks for, lowest first: its stack and the one shown. */
export function heightsOf({ stackMm, toolHeightMm }: Pick<MapSettings, 'stackMm' | 'toolHeightMm'>): number[] {
  return [...new Set([...stackMm, toolHeightMm])].sort((one, other) => one - other);
}

/** The heights whose maps are shown: the one, or all that the worst is taken of. */
export function shownHeights(settings: Pick<MapSettings, 'stackMm' | 'toolHeightMm' | 'stackShown'>): number[] {
  return settings.stackShown === 'worst' && settings.stackMm.length > 0
    ? heightsOf({ stackMm: settings.stackMm, toolHeightMm: settings.stackMm[0] })
    : [settings.toolHeightMm];
}

/**
 * The worst of one robot's maps at several heights, spot by spot and measure by measure: reached where every height is, else for
 * the reason of the first height that is not. The branch is the one of the worst inverse condition number.
 * @throws RangeError for no map, or maps of different grids.
 */
export function worstOfStack(tiles: readonly MapTile[]): MapTile {
  if (tiles.length === 0) throw new RangeError('A stack has no maps.');
  const [first] = tiles;
  if (tiles.length === 1) return first;
  const worst = makeMapTile(first.rowFrom, first.rowTo, first.columns);
  for (const tile of tiles) {
    if (tile.columns !== first.columns || tile.rowFrom !== first.rowFrom || tile.rowTo !== first.rowTo)
      throw new RangeError('The maps of a stack do not lie on one another.');
  }
  for (let cell = 0; cell < worst.reason.length; cell += 1) {
    const refusing = tiles.find(({ reason }) => reason[cell] !== 0);
    const least = (plane: (typeof VALUES)[number]) => Math.min(...tiles.map((tile) => tile[plane][cell]));
    worst.wristCoverage[cell] = least('wristCoverage');
    if (refusing) {
      worst.reason[cell] = refusing.reason[cell];
      worst.bindingJoint[cell] = refusing.bindingJoint[cell];
      continue;
    }
    for (const plane of VALUES) worst[plane][cell] = least(plane);
    const value = worst.inverseConditionNumber[cell];
    worst.branch[cell] = (tiles.find((tile) => tile.inverseConditionNumber[cell] === value) ?? first).branch[cell];
  }
  return worst;
}
