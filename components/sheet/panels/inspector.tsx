'use client';

import { Copy, Eye, EyeOff, Lock, LockOpen, Move, Trash2 } from 'lucide-react';
import { useBoardSheet } from '@/components/sheet/editor/board-context';
import { SelectionPanel } from '@/components/sheet/editor/selection-panel';
import { SaveFixtureButton } from '@/components/sheet/fixture-library/save-fixture-button';
import { useSelectionCommands } from '@/components/sheet/editor/use-selection-commands';
import { Button } from '@/components/ui/button';
import { kindWords } from '@/lib/editor/make-items';
import type { Item } from '@/lib/layout/items';
import { BlockFields } from './block-fields';
import { ConveyorFields, GuardLineFields, WalkwayFields } from './line-fields';
import { DimensionFields, SectionLineFields } from './measure-fields';
import { NameField } from './name-field';
import { NoteFields } from './note-fields';
import { PlaceFields } from './place-fields';
import { RobotFields } from './robot-fields';
import { TaskPointFields } from './task-point-fields';
import { ProtectiveDeviceFields } from '@/components/sheet/studies/protective-device-fields';
import { ZoneFields } from '@/components/sheet/studies/zone-fields';
import { useItemEdit } from './use-item-edit';

/** What is chosen, with everything about it that can be typed. */
export function Inspector({ emptyWords = false }: { readonly emptyWords?: boolean }) {
  const items = useBoardSheet((state) => state.items);
  const { itemIds } = useBoardSheet((state) => state.selection);
  const chosen = itemIds.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
  if (chosen.length === 0) {
    return emptyWords ? (
      <p className="px-3.5 py-3 text-sm text-ink-soft">
        Nothing is chosen. Tap something on the sheet, or in the list.
      </p>
    ) : null;
  }
  return (
    <section aria-label="What is chosen" data-inspector className="border-b border-rule px-3.5 pt-2 pb-3">
      {chosen.length === 1 ? <OneItem key={chosen[0].id} item={chosen[0]} /> : <SelectionPanel items={chosen} />}
    </section>
  );
}

function OneItem({ item }: { readonly item: Item }) {
  const edit = useItemEdit(item);
  return (
    <>
      <div className="flex items-center gap-1">
        <NameField
          label={`Name of the ${kindWords(item).toLowerCase()}`}
          value={item.name}
          onCommit={(name) => edit('Name', { name })}
        />
        <Button
          variant="quiet"
          size="icon"
          aria-pressed={item.hidden}
          aria-label={item.hidden ? `Show ${item.name}` : `Hide ${item.name}`}
          onClick={() => edit(item.hidden ? 'Showing' : 'Hiding', { hidden: !item.hidden })}
        >
          {item.hidden ? <EyeOff aria-hidden className="size-4" /> : <Eye aria-hidden className="size-4" />}
        </Button>
        <Button
          variant="quiet"
          size="icon"
          aria-pressed={item.locked}
          aria-label={item.locked ? `Unlock ${item.name}` : `Lock ${item.name}`}
          onClick={() => edit(item.locked ? 'Unlocking' : 'Locking', { locked: !item.locked })}
        >
          {item.locked ? <Lock aria-hidden className="size-4" /> : <LockOpen aria-hidden className="size-4" />}
        </Button>
        <Copies label={item.name} locked={item.locked} />
      </div>
      {!(item.kind === 'dimension' && item.fromItemId) && <PlaceFields item={item} />}
      <OwnFields item={item} />
    </>
  );
}

function OwnFields({ item }: { readonly item: Item }) {
  switch (item.kind) {
    case 'robot':
      return <RobotFields robot={item} />;
    case 'fixture':
      return (
        <>
          <BlockFields item={item} />
          <TaskPointFields fixture={item} />
          <SaveFixtureButton fixture={item} />
        </>
      );
    case 'obstacle':
      return <BlockFields item={item} />;
    case 'guardLine':
      return <GuardLineFields item={item} />;
    case 'walkway':
      return <WalkwayFields item={item} />;
    case 'dimension':
      return <DimensionFields item={item} />;
    case 'conveyor':
      return <ConveyorFields item={item} />;
    case 'sectionLine':
      return <SectionLineFields item={item} />;
    case 'note':
      return <NoteFields item={item} />;
    case 'zone':
      return <ZoneFields item={item} />;
    case 'protectiveDevice':
      return <ProtectiveDeviceFields item={item} />;
  }
}

function Copies({ label, locked }: { readonly label: string; readonly locked: boolean }) {
  const { duplicate, pickUp, remove } = useSelectionCommands();
  return (
    <>
      <Button variant="quiet" size="icon" aria-label={`Pick up ${label}`} disabled={locked} onClick={pickUp}>
        <Move aria-hidden className="size-4" />
      </Button>
      <Button variant="quiet" size="icon" aria-label={`Duplicate ${label}`} onClick={duplicate}>
        <Copy aria-hidden className="size-4" />
      </Button>
      <Button variant="quiet" size="icon" aria-label={`Delete ${label}`} disabled={locked} onClick={remove}>
        <Trash2 aria-hidden className="size-4" />
      </Button>
    </>
  );
}
