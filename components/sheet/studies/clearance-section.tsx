'use client';

import { useEffect, useState } from 'react';
import { useBoard } from '@/components/sheet/editor/board-context';
import { classNames } from '@/components/ui/class-names';
import { useUnits } from '@/lib/client/use-units';
import { clearanceOfRobots, MOVE_STEP_MM, type RobotClearance } from '@/lib/layout/clearance/robot-clearance';
import { Quiet, Section } from './section';
import { useStudySubjects } from './use-study-subjects';

/** Rows a robot: what is nearest is what matters. */
const SHOWN_ROWS = 6;

/** How near the robots come to what stands round them and to one another. */
export function ClearanceSection() {
  const { sheet } = useBoard();
  const { items, robots, working } = useStudySubjects();
  const { unit, figure } = useUnits();
  const [found, setFound] = useState<readonly RobotClearance[] | null>(null);
  useEffect(() => {
    // After the picture: it takes a while with many points, and the sheet shall stay quick under the hand.
    const timer = setTimeout(() => setFound(clearanceOfRobots(working, items)), 150);
    return () => clearTimeout(timer);
  }, [working, items]);
  const nameOf = (robotId: string) => robots.find(({ robot }) => robot.id === robotId)?.robot.name ?? '–';
  if (robots.length === 0) return null;
  return (
    <Section title="Clearance">
      {found === null && <Quiet>Measuring</Quiet>}
      {found?.map(({ robotId, rows, linkRadiusMm }) => (
        <div key={robotId} className="mb-2">
          <h3 className="text-sm font-medium">
            {nameOf(robotId)}{' '}
            <span className="font-normal text-ink-soft">
              links taken {figure(Math.round(linkRadiusMm))} {unit} thick to each side
            </span>
          </h3>
          {rows.length === 0 ? (
            <Quiet>Nothing stands round it, or no task point falls to it.</Quiet>
          ) : (
            <table className="w-full border-collapse text-sm" data-clearance={nameOf(robotId)}>
              <thead className="sr-only">
                <tr>
                  <th scope="col">Where</th>
                  <th scope="col">Between</th>
                  <th scope="col">Distance</th>
                </tr>
              </thead>
              <tbody>
                {rows.slice(0, SHOWN_ROWS).map((row) => (
                  <tr key={`${row.where} ${row.moving}`} className="border-t border-hair align-top">
                    <td className="py-0.5">
                      {row.where}
                      <span className="block text-[0.8125rem] text-ink-soft">
                        {row.part} and{' '}
                        <button
                          type="button"
                          className="underline hover:text-petrol"
                          onClick={() => sheet.select({ itemIds: [row.otherId], taskPointId: null })}
                        >
                          {row.other}
                        </button>
                        {row.moving && ', on the way'}
                      </span>
                    </td>
                    <td
                      className={classNames(
                        'py-0.5 text-right font-mono whitespace-nowrap tabular-nums',
                        row.distanceMm <= 0 && 'font-semibold text-red',
                      )}
                    >
                      {row.distanceMm <= 0 ? 'collides' : `${figure(Math.floor(row.distanceMm))} ${unit}`}
                    </td>
                  </tr>
                ))}
              </tbody>
            </table>
          )}
        </div>
      ))}
      <Quiet>
        Links are capsules whose thickness is estimated from the reach; the tool is as thick as its radius and may touch
        its own fixture. Moves are taken joint by joint from point to point and looked at every {MOVE_STEP_MM} mm. Of
        another robot every task point counts, whenever it may be there.
      </Quiet>
    </Section>
  );
}
