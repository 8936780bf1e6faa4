'use client';

import { useMemo } from 'react';
import { useBoard } from '@/components/sheet/editor/board-context';
import { classNames } from '@/components/ui/class-names';
import { useUnits } from '@/lib/client/use-units';
import { itemToFloor } from '@/lib/layout/geometry';
import type { ProtectiveDevice } from '@/lib/layout/items';
import { protectiveDistance } from '@/lib/layout/protective/protective-distance';
import { spaceToLine } from '@/lib/layout/spaces/guard-distance';
import { Cautions } from './cautions';
import { Quiet, Section } from './section';
import { useSpaces, type RobotSpaces } from './use-spaces';
import { useStudySubjects } from './use-study-subjects';

/** Every protective device: the distance that it asks for beside the one that it has. */
export function DeviceSection() {
  const { items } = useStudySubjects();
  const { robots } = useSpaces();
  const devices = useMemo(
    () => items.filter((item): item is ProtectiveDevice => item.kind === 'protectiveDevice'),
    [items],
  );
  return (
    <Section title="Protective devices">
      {devices.length === 0 ? (
        <Quiet>
          None yet. Draw a light curtain or a scanner field with the tool “Protective device” and enter its times.
        </Quiet>
      ) : (
        <ul className="text-sm">
          {devices.map((device) => (
            <DeviceRow key={device.id} device={device} robots={robots} />
          ))}
        </ul>
      )}
      <Cautions />
    </Section>
  );
}

function DeviceRow({ device, robots }: { readonly device: ProtectiveDevice; readonly robots: readonly RobotSpaces[] }) {
  const { sheet, view } = useBoard();
  const { unit, figure } = useUnits();
  const answer = protectiveDistance(device);
  const nearest = useMemo(() => nearestSpace(device, robots), [device, robots]);
  const open = () => {
    sheet.select({ itemIds: [device.id], taskPointId: null });
    view.openSide('values');
  };
  const isShort = answer.told && nearest !== null && nearest.distanceMm < answer.distanceMm;
  return (
    <li className="border-t border-hair py-1" data-device={device.name}>
      <div className="flex items-baseline justify-between gap-3">
        <button type="button" className="text-left underline hover:text-petrol" onClick={open}>
          {device.name}
        </button>
        {answer.told ? (
          <span className="font-mono whitespace-nowrap">
            S = {figure(Math.ceil(answer.distanceMm - 1e-6))} {unit}
          </span>
        ) : (
          <span className="text-red">{answer.questions.length} figures missing</span>
        )}
      </div>
      {answer.told ? (
        nearest && (
          <p className={classNames('text-[0.8125rem]', isShort ? 'font-medium text-red' : 'text-ink-soft')}>
            Stands {figure(Math.floor(nearest.distanceMm))} {unit} off {nearest.words}
            {isShort && `: ${figure(Math.ceil(answer.distanceMm - nearest.distanceMm))} ${unit} too near`}.{' '}
            {answer.source}.
          </p>
        )
      ) : (
        <ul className="list-disc pl-4 text-[0.8125rem] leading-4.5 text-red">
          {answer.questions.map(({ field, words }) => (
            <li key={field}>{words}</li>
          ))}
        </ul>
      )}
    </li>
  );
}

/** The restricted space of the nearest robot: where nobody may be before the arm stands still. */
function nearestSpace(device: ProtectiveDevice, robots: readonly RobotSpaces[]) {
  const line = device.pointsMm.map((point) => itemToFloor(device, point));
  const rows = robots.flatMap(({ robot, spaces }) => {
    const space = spaces.find(({ kind }) => kind === 'restricted') ?? spaces[0];
    const { distanceMm } = spaceToLine(space.outlineMm, line, false);
    return [{ distanceMm, words: `the ${space.kind} space of ${robot.name}` }];
  });
  return rows.length === 0 ? null : rows.reduce((best, row) => (row.distanceMm < best.distanceMm ? row : best));
}
