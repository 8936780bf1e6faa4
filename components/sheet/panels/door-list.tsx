'use client';

import { Plus, Trash2 } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { Select } from '@/components/ui/select';
import { guardLengthMm } from '@/lib/layout/guard-doors';
import { doorFault } from '@/lib/layout/item-fault';
import { doorSchema, type Door, type GuardLine } from '@/lib/layout/items';
import { NameField } from './name-field';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

const DOOR_MM = 1000;
const KINDS = [
  { value: 'hinged-out', label: 'Opens outwards' },
  { value: 'hinged-in', label: 'Opens inwards' },
  { value: 'sliding', label: 'Slides' },
] as const;
const HINGES = [
  { value: 'start', label: 'Hinge at start' },
  { value: 'end', label: 'Hinge at end' },
] as const;
const SLIDES = [
  { value: 'start', label: 'Slides to start' },
  { value: 'end', label: 'Slides to end' },
] as const;

/** The first free stretch of the line that a usual door fits into; null where there is none. */
function freeDoor(guard: GuardLine, id: string): Door | null {
  const step = DOOR_MM / 2;
  const number = guard.doors.length + 1;
  for (let alongMm = step; alongMm + DOOR_MM <= guardLengthMm(guard); alongMm += step) {
    const door = doorSchema.parse({ id, name: `Door ${number}`, alongMm, widthMm: DOOR_MM });
    if (!doorFault(guard, door)) return door;
  }
  return null;
}

/** The doors of a guard line, each with its place along the line. */
export function DoorList({ guard }: { readonly guard: GuardLine }) {
  const edit = useItemEdit(guard);
  const set = (door: Door, patch: Partial<Door>): string | null => {
    const after = { ...door, ...patch };
    const isPlaced = patch.alongMm !== undefined || patch.widthMm !== undefined;
    const fault = isPlaced ? doorFault(guard, after) : null;
    return fault ?? edit('Door', { doors: guard.doors.map((entry) => (entry.id === door.id ? after : entry)) });
  };
  const next = freeDoor(guard, crypto.randomUUID());
  return (
    <section aria-label="Doors" className="mt-2">
      <div className="flex items-center justify-between">
        <h3 className="text-[0.8125rem] font-medium text-ink-soft">Doors</h3>
        <Button
          variant="quiet"
          size="small"
          className="-mr-2.5"
          disabled={guard.locked || next === null}
          onClick={() => next && edit('Door', { doors: [...guard.doors, next] })}
        >
          <Plus aria-hidden className="size-4" /> Add a door
        </Button>
      </div>
      {guard.doors.length === 0 && (
        <p className="text-sm text-ink-soft">{next ? 'None yet.' : 'The line is too short for a door.'}</p>
      )}
      <ol>
        {guard.doors.map((door) => (
          <li key={door.id} className="grid grid-cols-2 gap-x-3 gap-y-1 border-b border-hair py-1.5">
            <div className="col-span-2 flex items-center">
              <NameField
                label="Name of the door"
                value={door.name}
                disabled={guard.locked}
                onCommit={(name) => set(door, { name })}
              />
              <Button
                variant="quiet"
                size="icon"
                disabled={guard.locked}
                aria-label={`Delete ${door.name}`}
                onClick={() => edit('Door', { doors: guard.doors.filter(({ id }) => id !== door.id) })}
              >
                <Trash2 aria-hidden className="size-3.5" />
              </Button>
            </div>
            <ValueField
              label="From the first corner"
              kind="length"
              value={door.alongMm}
              step={50}
              disabled={guard.locked}
              onCommit={(alongMm) =>
                alongMm < 0 ? 'A door stands 0 mm or more from the first corner.' : set(door, { alongMm })
              }
            />
            <ValueField
              label="Door width"
              kind="length"
              value={door.widthMm}
              step={50}
              disabled={guard.locked}
              onCommit={(widthMm) => (widthMm <= 0 ? 'A door has a width above zero.' : set(door, { widthMm }))}
            />
            <Select
              aria-label={`How ${door.name} opens`}
              value={door.kind}
              disabled={guard.locked}
              options={KINDS}
              onValueChange={(kind) => set(door, { kind })}
            />
            <Select
              aria-label={door.kind === 'sliding' ? `Where ${door.name} slides to` : `Hinge of ${door.name}`}
              value={door.hinge}
              disabled={guard.locked}
              options={door.kind === 'sliding' ? SLIDES : HINGES}
              onValueChange={(hinge) => set(door, { hinge })}
            />
          </li>
        ))}
      </ol>
    </section>
  );
}
