'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import { JointStopFields } from '@/components/sheet/studies/joint-stop-fields';
import { PayloadFields } from '@/components/sheet/judging/payload-fields';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { toolSchema, type Robot } from '@/lib/layout/items';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

const TURNS = [
  ['rollDeg', 'Turn about x'],
  ['pitchDeg', 'Turn about y'],
  ['yawDeg', 'Turn about z'],
] as const;

/** Arm, riser and tool of a robot. */
export function RobotFields({ robot }: { readonly robot: Robot }) {
  const { libraryArms, arms } = useBoard();
  const edit = useItemEdit(robot);
  const tool = (patch: Partial<Robot['tool']>) => {
    const checked = toolSchema.safeParse({ ...robot.tool, ...patch });
    if (!checked.success) return 'That is farther than a tool goes. Write a smaller value.';
    return edit('Tool', { tool: checked.data });
  };
  const own = arms.get(robot.armId);
  const choices = libraryArms.some(({ id }) => id === robot.armId) || !own ? libraryArms : [own, ...libraryArms];
  return (
    <>
      <Field label="Arm" inline className="mt-2 grid-cols-[2.5rem_minmax(0,1fr)]!">
        <Select
          className="min-h-7 text-sm"
          value={robot.armId}
          disabled={robot.locked}
          onValueChange={(armId) => edit('Arm', { armId })}
          options={choices.map(({ id, name, version, latest }) => ({
            value: id,
            label: latest ? name : `${name}, version ${version}`,
          }))}
        />
      </Field>
      <div className="mt-2 grid grid-cols-3 gap-x-3 gap-y-1.5">
        <ValueField
          label="Riser"
          kind="length"
          value={robot.riserMm}
          step={50}
          disabled={robot.locked}
          onCommit={(riserMm) =>
            riserMm < 0 ? 'A riser stands on the floor: write 0 or more.' : edit('Riser', { riserMm })
          }
        />
        <ValueField
          label="Tool length"
          kind="length"
          value={robot.tool.zMm}
          disabled={robot.locked}
          onCommit={(zMm) => tool({ zMm })}
        />
        <ValueField
          label="Tool mass"
          kind="number"
          unit="kg"
          step={1}
          value={robot.tool.massKg}
          disabled={robot.locked}
          onCommit={(massKg) => (massKg < 0 ? 'A mass is 0 kg or more.' : tool({ massKg }))}
        />
      </div>
      <details className="mt-2">
        <summary className="text-sm text-ink-soft hover:text-petrol">Tool offset and turn</summary>
        <div className="mt-1 grid grid-cols-3 gap-x-3 gap-y-1.5">
          <ValueField label="Offset x" kind="length" value={robot.tool.xMm} onCommit={(xMm) => tool({ xMm })} />
          <ValueField label="Offset y" kind="length" value={robot.tool.yMm} onCommit={(yMm) => tool({ yMm })} />
          <ValueField label="Offset z" kind="length" value={robot.tool.zMm} onCommit={(zMm) => tool({ zMm })} />
          {TURNS.map(([key, label]) => (
            <ValueField
              key={key}
              label={label}
              kind="angle"
              step={5}
              value={robot.tool[key]}
              onCommit={(value) => tool({ [key]: value })}
            />
          ))}
        </div>
      </details>
      <PayloadFields robot={robot} />
      <JointStopFields robot={robot} />
    </>
  );
}
