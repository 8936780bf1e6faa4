'use client';

import { ValueField } from '@/components/sheet/panels/value-field';
import { Checkbox } from '@/components/ui/checkbox';
import type { TaskPath } from '@/lib/layout/items';

type Aim = Pick<TaskPath, 'tiltDeg' | 'azimuthDeg' | 'rollDeg' | 'speedMmS'>;

interface AimFieldsProps {
  readonly task: Aim;
  readonly disabled?: boolean;
  readonly onEdit: (label: string, patch: Partial<Aim>) => string | null;
}

/** How the tool is held and how fast it shall go: at a task point, or at every place of a path or a pattern. Cells of a grid of three. */
export function AimFields({ task, disabled, onEdit }: AimFieldsProps) {
  const isRollFree = task.rollDeg === 'free';
  return (
    <>
      <ValueField
        label="Tilt from down"
        kind="angle"
        step={5}
        value={task.tiltDeg}
        disabled={disabled}
        onCommit={(tiltDeg) =>
          tiltDeg < 0 || tiltDeg > 180 ? 'Write 0 (straight down) to 180 (straight up).' : onEdit('Tilt', { tiltDeg })
        }
      />
      <ValueField
        label="Tilts towards"
        kind="angle"
        step={5}
        value={task.azimuthDeg}
        disabled={disabled}
        onCommit={(azimuthDeg) => onEdit('Azimuth', { azimuthDeg })}
      />
      <ValueField
        label="Roll"
        kind="angle"
        step={5}
        value={task.rollDeg === 'free' ? 0 : task.rollDeg}
        disabled={disabled || isRollFree}
        onCommit={(rollDeg) => onEdit('Roll', { rollDeg })}
      />
      <ValueField
        label="Wanted speed"
        kind="number"
        unit="mm/s"
        step={50}
        value={task.speedMmS ?? 0}
        disabled={disabled}
        onCommit={(speed) =>
          speed < 0
            ? 'Write a speed above zero, or 0 for none.'
            : onEdit('Speed', { speedMmS: speed === 0 ? null : speed })
        }
      />
      <Checkbox
        className="col-span-2 self-end"
        label="Roll is free"
        checked={isRollFree}
        disabled={disabled}
        onCheckedChange={(free) => onEdit('Roll', { rollDeg: free ? 'free' : 0 })}
      />
    </>
  );
}
