'use client';

import { memo, useMemo } from 'react';
import { Layer } from 'react-konva';
import { settledItems } from '@/lib/layout/attached-dimensions';
import type { Item } from '@/lib/layout/items';
import type { LengthUnit } from '@/lib/layout/length-units';
import { ItemNames } from './item-names';
import { ItemShape } from './item-shape';
import type { DrawingMode, DrawnArm, DrawnBand, SheetPointer } from './types';
import { usePalette } from './use-palette';

export interface ItemsLayerProps {
  /** In drawing order, the lowest first. Hidden ones are left out. An item that is unchanged must keep its identity. */
  readonly items: readonly Item[];
  readonly arms: ReadonlyMap<string, DrawnArm>;
  readonly mode: DrawingMode;
  /** Chosen items stand on a canvas of their own, so that dragging them draws nothing else. */
  readonly selectedIds?: ReadonlySet<string>;
  readonly selectedTaskPointId?: string | null;
  /** Actuator values by robot id (rad or m); a robot without is drawn as its base. */
  readonly postures?: ReadonlyMap<string, readonly number[]>;
  /** How strongly it is drawn, 0 to 1; what is chosen is always drawn in full. */
  readonly opacity?: number;
  /** What lengths are lettered in. */
  readonly lengthUnit?: LengthUnit;
  /** By task point id. */
  readonly verdicts?: ReadonlyMap<string, DrawnBand>;
  /** Both listen in `edit` mode only, and must keep their identity between renders. */
  readonly onItemPointerDown?: (itemId: string, pointer: SheetPointer) => void;
  readonly onTaskPointPointerDown?: (fixtureId: string, taskPointId: string, pointer: SheetPointer) => void;
}

const NOTHING: ReadonlySet<string> = new Set();
/** Lines lie under bodies, robots over them, whatever order they were placed in. */
const DEPTH: Record<Item['kind'], number> = {
  zone: 0,
  walkway: 0,
  guardLine: 1,
  protectiveDevice: 1,
  obstacle: 2,
  conveyor: 3,
  fixture: 4,
  sectionLine: 5,
  dimension: 6,
  robot: 7,
  note: 8,
};

/** Everything that stands on the sheet, names last so that no body covers them. Two canvases: resting and chosen. */
export const ItemsLayer = memo(function ItemsLayer(props: ItemsLayerProps) {
  const { items, selectedIds = NOTHING } = props;
  const ordered = useMemo(
    () =>
      settledItems(items)
        .filter(({ hidden }) => !hidden)
        .sort((a, b) => DEPTH[a.kind] - DEPTH[b.kind]),
    [items],
  );
  const resting = ordered.filter(({ id }) => !selectedIds.has(id));
  const chosen = ordered.filter(({ id }) => selectedIds.has(id));
  return (
    <>
      <ItemGroup {...props} items={resting} chosen={false} />
      <ItemGroup {...props} items={chosen} chosen />
    </>
  );
});

interface ItemGroupProps extends ItemsLayerProps {
  readonly chosen: boolean;
}

const ItemGroup = memo(function ItemGroup(props: ItemGroupProps) {
  const {
    items,
    arms,
    mode,
    postures,
    verdicts,
    chosen,
    opacity = 1,
    lengthUnit = 'mm',
    selectedTaskPointId = null,
  } = props;
  const palette = usePalette(mode);
  return (
    <Layer listening={mode === 'edit'} opacity={chosen ? 1 : opacity}>
      {items.map((item) => (
        <ItemShape
          key={item.id}
          item={item}
          arm={item.kind === 'robot' ? arms.get(item.armId) : undefined}
          posture={item.kind === 'robot' ? postures?.get(item.id) : undefined}
          verdicts={item.kind === 'fixture' ? verdicts : undefined}
          selectedTaskPointId={item.kind === 'fixture' ? selectedTaskPointId : null}
          chosen={chosen}
          mode={mode}
          palette={palette}
          lengthUnit={lengthUnit}
          onItemPointerDown={props.onItemPointerDown}
          onTaskPointPointerDown={props.onTaskPointPointerDown}
        />
      ))}
      <ItemNames items={items} arms={arms} palette={palette} lengthUnit={lengthUnit} />
    </Layer>
  );
}, drawsAlike);

/** A group is drawn again only for a member that changed: a drag makes new lists on every move, mostly of the same items. */
function drawsAlike(before: ItemGroupProps, after: ItemGroupProps): boolean {
  const sameItems =
    before.items.length === after.items.length && before.items.every((item, index) => item === after.items[index]);
  return sameItems && DRAWN_PROPS.every((name) => before[name] === after[name]);
}

const DRAWN_PROPS = [
  'arms',
  'mode',
  'postures',
  'verdicts',
  'opacity',
  'lengthUnit',
  'selectedTaskPointId',
  'onItemPointerDown',
  'onTaskPointPointerDown',
] as const satisfies readonly (keyof ItemGroupProps)[];
