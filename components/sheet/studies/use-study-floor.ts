'use client';

import { useMemo } from 'react';
import { useStudy } from '@/lib/client/use-study';
import { NO_ROBOT, type FloorGrid, type FloorMap } from '@/lib/layout/floor-map';
import type { ValueRange } from '@/lib/layout/scales';
import type { Stand } from '@/lib/layout/standing/answer';
import { useStudyView } from './study-store';

/** A finished study that lies on the floor in place of the dexterity map. */
export interface StudyFloor {
  readonly kind: 'standing' | 'errorGain';
  readonly moverId: string;
  readonly map: FloorMap;
  /** From poor to good: an error gain is the better the smaller it is. */
  readonly range: ValueRange;
  readonly best: Stand | null;
  readonly pointCount: number;
}

/** The study that is shown on the floor; null while none is, or it is not finished. */
export function useStudyFloor(): StudyFloor | null {
  const { standing, errorGain, shown } = useStudyView();
  const asked = shown === 'standing' ? standing : shown === 'errorGain' ? errorGain : null;
  const { study } = useStudy(asked?.studyId ?? null);
  const answer = study?.answer ?? null;
  return useMemo(() => {
    if (!asked || !answer || answer.study === 'tolerance') return null;
    const common = { moverId: asked.moverId, map: floorMapOf(asked.question.grid, answer.values) };
    if (answer.study === 'standing') {
      const most = answer.values.reduce((high, value) => Math.max(high, value), 0);
      const range = { from: 0, to: most || 1 };
      return { ...common, kind: 'standing', range, best: answer.best, pointCount: asked.work.length };
    }
    const range = { from: answer.most ?? 1, to: answer.least ?? 0 };
    return { ...common, kind: 'errorGain', range, best: null, pointCount: 0 };
  }, [asked, answer]);
}

/** Values below zero are floor without one. */
function floorMapOf(grid: FloorGrid, values: readonly number[]): FloorMap {
  return {
    grid,
    measure: 'inverseConditionNumber',
    value: Float32Array.from(values, (value) => (value < 0 ? NaN : value)),
    robot: Uint8Array.from(values, (value) => (value < 0 ? NO_ROBOT : 0)),
    branch: new Uint8Array(values.length),
    reachedBy: Uint8Array.from(values, (value) => (value < 0 ? 0 : 1)),
  };
}
