'use client';

import { X } from 'lucide-react';
import { useBoard } from '@/components/sheet/editor/board-context';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import type { JointStop, Robot } from '@/lib/layout/items';

/** Limiting devices on a robot's joints, and how far its tool stands out: what its spaces are worked out from. */
export function JointStopFields({ robot }: { readonly robot: Robot }) {
  const { arms } = useBoard();
  const edit = useItemEdit(robot);
  const definition = arms.get(robot.armId)?.definition;
  const limits = definition ? (definition.actuators ?? definition.joints) : [];
  const slides = (joint: number) => definition?.joints[joint - 1]?.type === 'prismatic';
  const free = limits.findIndex((_, index) => !robot.jointStops.some(({ joint }) => joint === index + 1));
  const set = (jointStops: JointStop[]) => edit('Limiting devices', { jointStops });
  const change = (joint: number, patch: Partial<JointStop>) => {
    const next = robot.jointStops.map((stop) => (stop.joint === joint ? { ...stop, ...patch } : stop));
    const stop = next.find((entry) => entry.joint === joint);
    if (stop && stop.min >= stop.max) return 'A stop begins below where it ends.';
    return set(next);
  };
  const add = () => {
    const { min, max } = limits[free];
    const unit = slides(free + 1) ? 1000 : 180 / Math.PI;
    const stop = { joint: free + 1, min: Math.round(min * unit), max: Math.round(max * unit) };
    set([...robot.jointStops, stop].sort((one, other) => one.joint - other.joint));
  };
  return (
    <details className="mt-2" open={robot.jointStops.length > 0 || undefined}>
      <summary className="text-sm text-ink-soft hover:text-petrol">Limiting devices and tool size</summary>
      <div className="mt-1 grid grid-cols-3 gap-x-3">
        <ValueField
          label="Tool radius"
          kind="length"
          value={robot.tool.radiusMm}
          disabled={robot.locked}
          onCommit={(radiusMm) =>
            radiusMm < 0 ? 'A radius is 0 or more.' : edit('Tool radius', { tool: { ...robot.tool, radiusMm } })
          }
        />
      </div>
      {robot.jointStops.map(({ joint, min, max }) => (
        <div key={joint} className="mt-1.5 grid grid-cols-[3.5rem_1fr_1fr_auto] items-end gap-x-3">
          <span className="pb-1 text-sm">Joint {joint}</span>
          <ValueField
            label="From"
            kind={slides(joint) ? 'length' : 'angle'}
            value={min}
            step={5}
            disabled={robot.locked}
            onCommit={(value) => change(joint, { min: value })}
          />
          <ValueField
            label="To"
            kind={slides(joint) ? 'length' : 'angle'}
            value={max}
            step={5}
            disabled={robot.locked}
            onCommit={(value) => change(joint, { max: value })}
          />
          <Button
            variant="quiet"
            size="icon"
            aria-label={`Remove the stop of joint ${joint}`}
            disabled={robot.locked}
            onClick={() => set(robot.jointStops.filter((stop) => stop.joint !== joint))}
          >
            <X aria-hidden className="size-4" />
          </Button>
        </div>
      ))}
      <Button className="mt-1.5" size="small" disabled={robot.locked || free < 0} onClick={add}>
        Add a stop
      </Button>
    </details>
  );
}
