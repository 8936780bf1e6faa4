'use client';

import { useMemo } from 'react';
import { useStudy } from '@/lib/client/use-study';
import { NO_ROBOT, type FloorMap } from '@/lib/layout/floor-map';
import type { ValueRange } from '@/lib/layout/scales';
import type { StandingAnswer } from '@/lib/layout/standing/answer';
import type { StandingQuestion } from '@/lib/layout/standing/question';
import { useStudyView, type AskedStudy } from './study-store';

export interface StandingOnFloor {
  readonly asked: AskedStudy<StandingQuestion>;
  readonly answer: StandingAnswer;
  readonly map: FloorMap;
  readonly range: ValueRange;
}

/** The finished standing map, while it is shown in place of the dexterity map. */
export function useStandingOnFloor(): StandingOnFloor | null {
  const { standing, isStandingShown } = useStudyView();
  const { study } = useStudy(isStandingShown && standing ? standing.studyId : null);
  const answer = study?.answer?.study === 'standing' ? study.answer : null;
  return useMemo(() => {
    if (!standing || !answer || !isStandingShown) return null;
    const { grid } = standing.question;
    const value = Float32Array.from(answer.values, (known) => (known < 0 ? NaN : known));
    const most = answer.values.reduce((high, known) => Math.max(high, known), 0);
    return {
      asked: standing,
      answer,
      range: { from: 0, to: most || 1 },
      map: {
        grid,
        measure: 'inverseConditionNumber',
        value,
        robot: Uint8Array.from(answer.values, (known) => (known < 0 ? NO_ROBOT : 0)),
        branch: new Uint8Array(value.length),
        reachedBy: Uint8Array.from(answer.values, (known) => (known < 0 ? 0 : 1)),
      },
    };
  }, [standing, answer, isStandingShown]);
}
