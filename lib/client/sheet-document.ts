import type { LibraryArm } from '@/lib/contracts/arms';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import type { Layout } from '@/lib/contracts/layouts';
import type { Revision, Snapshot } from '@/lib/contracts/revisions';
import type { Item } from '@/lib/layout/items';
import type { MapSettings } from '@/lib/layout/map-settings';

/** A sheet to be read, whether it is a draft or a revision. */
export interface SheetDocument {
  readonly letter: string;
  readonly name: string;
  /** `draft`, or `rev 7`. */
  readonly mark: string;
  readonly items: readonly Item[];
  readonly arms: ReadonlyMap<string, ReadArm>;
  readonly floorPlan: FloorPlan | null;
  readonly settings: MapSettings;
  /** Maps that were kept with a revision; empty for a draft. */
  readonly storedMaps: Snapshot['maps'];
}

export type ReadArm = Pick<LibraryArm, 'id' | 'name' | 'reachMm' | 'definition'>;

export function documentOfLayout(layout: Layout): SheetDocument {
  return {
    letter: layout.letter,
    name: layout.name,
    mark: 'draft',
    items: layout.items.map(({ item }) => item),
    arms: new Map(layout.arms.map((arm) => [arm.id, arm])),
    floorPlan: layout.floorPlan,
    settings: layout.mapSettings,
    storedMaps: [],
  };
}

export function documentOfRevision({ number, snapshot }: Revision): SheetDocument {
  return {
    letter: snapshot.letter,
    name: snapshot.name,
    mark: `rev ${number}`,
    items: snapshot.items,
    arms: new Map(snapshot.arms.map((arm) => [arm.id, arm])),
    floorPlan: snapshot.floorPlan,
    settings: snapshot.mapSettings,
    storedMaps: snapshot.maps,
  };
}
