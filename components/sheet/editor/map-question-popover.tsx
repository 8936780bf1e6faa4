'use client';

import { Popover } from 'radix-ui';
import { buttonLook } from '@/components/ui/button-look';
import { Field } from '@/components/ui/field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Select } from '@/components/ui/select';
import { ValueField } from '@/components/sheet/panels/value-field';
import { useBoard, useBoardSettings } from './board-context';
import { MapBranch } from './map-branch';
import { MapHeight, StackFields } from './map-height';
import { useSettingChange } from './use-setting-change';

const STEPS = [10, 20, 25, 40, 50, 100] as const;

/** Height and direction of the tool, and how fine the map is: what the map asks. */
export function MapQuestionPopover() {
  const { settings: keeper } = useBoard();
  const settings = useBoardSettings();
  const isUpright = settings.tiltDeg === 0 || settings.tiltDeg === 180;
  const change = useSettingChange();
  const stepChoices = [...new Set([...STEPS, settings.stepMm])].sort((one, other) => one - other);
  return (
    <Popover.Root>
      <Popover.Trigger className={buttonLook('quiet', 'small', '-my-1 min-h-6 px-1.5 underline underline-offset-2')}>
        Change
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          side="top"
          align="start"
          sideOffset={8}
          collisionPadding={8}
          aria-label="What the map asks"
          className="z-40 max-h-[min(80vh,var(--radix-popover-content-available-height))] w-80 max-w-[94vw] overflow-y-auto border border-rule bg-sheet p-3.5 text-ink focus-visible:outline-none"
        >
          <div className="grid grid-cols-2 gap-x-4 gap-y-2.5">
            <MapHeight />
            <ValueField
              label="Tilt from straight down"
              kind="angle"
              step={5}
              value={settings.tiltDeg}
              onCommit={(tiltDeg) => change({ tiltDeg }, 'Write 0 (straight down) to 180 (straight up).')}
            />
            {!isUpright && (
              <SegmentedControl
                className="col-span-2 self-start"
                label="A tilted tool points"
                value={settings.towards}
                onValueChange={(towards) => keeper.change({ towards })}
                options={[
                  { value: 'outward', label: 'Away from the robot' },
                  { value: 'heading', label: 'One way' },
                ]}
              />
            )}
            {!isUpright && settings.towards === 'heading' && (
              <ValueField
                label="Heading on the floor"
                kind="angle"
                step={5}
                value={settings.headingDeg}
                onCommit={(headingDeg) => change({ headingDeg }, 'Write −360 to 360 degrees.')}
              />
            )}
            <ValueField
              label="Cone about it, half angle"
              kind="angle"
              step={5}
              value={settings.coneDeg}
              onCommit={(coneDeg) => change({ coneDeg }, 'Write 0 (one direction) to 90 degrees.')}
            />
            <SegmentedControl
              className="col-span-2 self-start"
              label="Roll of the tool"
              value={settings.rollDeg === 'free' ? 'free' : 'fixed'}
              onValueChange={(roll) => keeper.change({ rollDeg: roll === 'free' ? 'free' : 0 })}
              options={[
                { value: 'free', label: 'Roll free' },
                { value: 'fixed', label: 'Roll fixed' },
              ]}
            />
            {settings.rollDeg !== 'free' && (
              <ValueField
                label="Roll"
                kind="angle"
                step={5}
                value={settings.rollDeg}
                onCommit={(rollDeg) => change({ rollDeg }, 'Write −360 to 360 degrees.')}
              />
            )}
            <MapBranch />
            <StackFields />
            <Field label="A value every" className="col-span-2">
              <Select
                value={String(settings.stepMm)}
                onValueChange={(step) => keeper.change({ stepMm: Number(step) })}
                options={stepChoices.map((step) => ({
                  value: String(step),
                  label: `${step} mm`,
                  note: step <= 10 ? 'fine, takes longer' : undefined,
                }))}
              />
            </Field>
          </div>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
