'use client';

import { X } from 'lucide-react';
import { useBoard, useBoardSettings, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useLastInput } from '@/components/sheet/editor/use-last-input';
import { usePlace } from '@/components/sheet/editor/use-place';
import { usePlumb } from '@/components/sheet/editor/readings-context';
import { Button } from '@/components/ui/button';
import { Select } from '@/components/ui/select';
import { printed } from '@/lib/editor/measure-text';
import type { PlumbPosture, PlumbReading } from '@/lib/editor/plumb';
import { PlumbFiguresList } from './plumb-figures-list';
import { Reading, ReadingList } from './reading-list';
import { RiserSlider } from './riser-slider';
import { SideElevation } from './side-elevation';
import { SpeedShapes } from './speed-shapes';

const BEST = 'best';

/** Everything at the spot under the plumb. */
export function PlumbPanel() {
  const { sheet, arms } = useBoard();
  const settings = useBoardSettings();
  const taskPointId = useBoardSheet((state) => state.selection.taskPointId);
  const { spot, reading, posture } = usePlumb();
  const { take, placeAtOnce } = usePlace();
  const lastInput = useLastInput();

  if (!spot) {
    return (
      <section aria-labelledby="plumb-title" className="border-b border-rule px-3.5 pt-3 pb-3.5">
        <h2 id="plumb-title" className="text-[0.8125rem] font-medium text-ink-soft">
          Plumb
        </h2>
        <p className="mt-1 text-sm text-ink-soft">Drop it on a spot to read posture, speeds and margins there.</p>
        <Button
          size="small"
          className="mt-2"
          onClick={() => (lastInput() === 'keyboard' ? placeAtOnce('plumb') : take('plumb'))}
        >
          Drop the plumb
        </Button>
      </section>
    );
  }

  const [x, y] = spot.positionMm;
  const title = spot.taskPoint
    ? `Plumb at ${spot.taskPoint.point.name}`
    : `Plumb at x ${printed(x, 0)}, y ${printed(y, 0)}`;
  const lift = () => {
    sheet.hangPlumb(null);
    if (taskPointId) sheet.select({ ...sheet.getState().selection, taskPointId: null });
  };
  return (
    <section
      aria-labelledby="plumb-title"
      data-plumb={`${printed(x, 0)} ${printed(y, 0)}`}
      className="border-b border-rule px-3.5 pt-1.5 pb-2.5"
    >
      <div className="flex items-center justify-between gap-2 pb-1">
        <h2 id="plumb-title" className="truncate text-[0.8125rem] font-medium text-ink-soft">
          {title}
        </h2>
        <span className="flex flex-none items-center">
          <RobotChoice />
          <Button variant="quiet" size="icon" aria-label="Lift the plumb" className="-mr-2 size-7" onClick={lift}>
            <X aria-hidden className="size-3.5" />
          </Button>
        </span>
      </div>
      {reading ? (
        <>
          <SideElevation reading={reading} posture={posture} arm={arms.get(reading.robot.armId)} settings={settings} />
          <RiserSlider robot={reading.robot} />
          {posture ? (
            <>
              <PostureReadings reading={reading} posture={posture} />
              <SpeedShapes reading={reading} posture={posture} />
              <PlumbFiguresList reading={reading} posture={posture} />
            </>
          ) : (
            <p role="status" className="mt-2 font-medium text-red">
              {reading.robot.name}: {reading.refusal}
            </p>
          )}
        </>
      ) : (
        <p className="text-sm text-ink-soft">No robot on the sheet reads this spot yet. Place one.</p>
      )}
    </section>
  );
}

function RobotChoice() {
  const { robots, reading, chosenRobotId, chooseRobot } = usePlumb();
  if (robots.length < 2) return <span className="text-sm font-medium">{reading?.robot.name}</span>;
  const bestWords = chosenRobotId ? 'Best robot' : `Best: ${reading?.robot.name ?? '–'}`;
  return (
    <Select
      aria-label="Robot that is read"
      value={chosenRobotId ?? BEST}
      onValueChange={(value) => chooseRobot(value === BEST ? null : value)}
      className="min-h-7 max-w-32 border-transparent px-1.5 text-sm"
      options={[{ value: BEST, label: bestWords }, ...robots.map(({ id, name }) => ({ value: id, label: name }))]}
    />
  );
}

interface PostureReadingsProps {
  readonly reading: PlumbReading;
  readonly posture: PlumbPosture;
}

function PostureReadings({ reading, posture }: PostureReadingsProps) {
  const { chooseBranch } = usePlumb();
  const { postures } = reading;
  return (
    <ReadingList>
      {postures.length > 1 && (
        <div className="flex items-center justify-between gap-3">
          <dt>Posture</dt>
          <dd className="min-w-0">
            <Select
              aria-label="Posture"
              value={posture.branch || String(postures.indexOf(posture))}
              onValueChange={chooseBranch}
              className="-mr-2.5 min-h-7 max-w-60 border-transparent px-1.5 text-sm"
              options={postures.map(({ branch, inverseConditionNumber }, index) => ({
                value: branch || String(index),
                label: branch || `Posture ${index + 1}`,
                note: <span className="font-mono">1/κ {inverseConditionNumber?.toFixed(2) ?? '–'}</span>,
              }))}
            />
          </dd>
        </div>
      )}
      <Reading label="Inverse condition number" value={posture.inverseConditionNumber} digits={2} />
      <Reading label="Fastest tool speed" value={posture.maximumToolSpeed} digits={2} unit="m/s" />
      <Reading label="Speed in every direction" value={posture.sureSpeed} digits={2} unit="m/s" />
      <Reading label="Bound by" words={posture.bindingJoint === null ? '–' : `J${posture.bindingJoint}`} />
      <Reading label="Nearest joint limit" words={`J${posture.limit.joint}, ${posture.limit.words}`} />
    </ReadingList>
  );
}
