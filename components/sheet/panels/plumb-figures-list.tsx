'use client';

import { useMemo } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { printedFixed } from '@/lib/editor/measure-text';
import type { PlumbPosture, PlumbReading } from '@/lib/editor/plumb';
import { plumbFigures, type PrincipalFigure } from '@/lib/editor/plumb-figures';
import { Reading, ReadingList } from './reading-list';
import { useWristCoverage } from './use-wrist-coverage';

interface PlumbFiguresListProps {
  readonly reading: PlumbReading;
  readonly posture: PlumbPosture;
}

/** What a posture is worth to the full: error, pose, coverage, and the directions that the tool moves in best and worst. */
export function PlumbFiguresList({ reading, posture }: PlumbFiguresListProps) {
  const { wrist } = useBoardSettings();
  const figures = useMemo(() => plumbFigures(reading, posture, wrist), [reading, posture, wrist]);
  const coverage = useWristCoverage(reading);
  const { error, poseCondition, principal, stillCount } = figures;
  return (
    <ReadingList>
      <Reading label="Error gain, 1 arcmin a joint" value={error.worstMm} digits={2} unit="mm" />
      <Reading label="The same, independent errors" value={error.rootSumSquareMm} digits={2} unit="mm" />
      {poseCondition && (
        <Reading
          label="Moving and turning together, 1/κ"
          words={`${printedFixed(poseCondition.inverse, 2)} at ${printedFixed(poseCondition.lengthMm, 0)} mm`}
        />
      )}
      <Reading
        label="Wrist coverage"
        words={
          coverage
            ? `${Math.round((100 * coverage.reached) / coverage.asked)} %${coverage.asked < coverage.of ? ' so far' : ''}`
            : 'working'
        }
      />
      {stillCount > 0 && <Reading label="Spare motions of the arm" words={String(stillCount)} />}
      {principal.length > 0 && (
        <div>
          <dt className="mt-1 text-[0.8125rem] text-ink-soft">
            Best to worst direction, and the joint that works most
          </dt>
          {principal.map((direction, index) => (
            <dd key={index} className="flex justify-between gap-3 font-mono text-sm tabular-nums">
              <span>{directionWords(direction)}</span>
              <span className="whitespace-nowrap">
                {printedFixed(direction.gain, 2)} m/s{direction.joint === null ? '' : `, J${direction.joint}`}
              </span>
            </dd>
          ))}
        </div>
      )}
    </ReadingList>
  );
}

/** Nearer to level or to upright than this (degrees) counts as such. */
const NEARLY_DEG = 0.5;

function directionWords({ headingDeg, riseDeg }: PrincipalFigure): string {
  if (headingDeg === null || riseDeg > 90 - NEARLY_DEG) return 'up and down';
  const level = `${printedFixed(headingDeg, 0)}°`;
  return riseDeg < NEARLY_DEG ? `level, ${level}` : `${level}, ${printedFixed(riseDeg, 0)}° up`;
}
