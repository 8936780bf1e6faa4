import { QueryTypes } from 'sequelize';
import { standingQuestionSchema, type StandingQuestion } from '@/lib/layout/standing/question';
import { sequelize } from '@/lib/server/database';
import { studySliceJob, type StudySliceJob } from '@/lib/server/jobs';
import { QUEUE_SCHEMA } from '@/lib/server/queue';
import { answerStudy, computeSlice } from '@/lib/server/studies/compute';
import type { StudyComputer } from '@/lib/server/studies/computer';
import { runStudySlice } from '@/lib/server/studies/run-slice';

let lifted = 0;

/** A small standing map that nobody has asked yet: one point, 20 by 20 places. */
export function newStudyQuestion(armId: string, change: object = {}): StandingQuestion {
  lifted += 1;
  return standingQuestionSchema.parse({
    study: 'standing',
    mover: 'robot',
    armId,
    tool: { xMm: 0, yMm: 0, zMm: 100, rollDeg: 0, pitchDeg: 0, yawDeg: 0 },
    wrist: 'held',
    robot: { xMm: 0, yMm: 0, angleDeg: 0, riserMm: 0 },
    points: [{ fixture: { xMm: 500, yMm: 0, angleDeg: 0 }, xMm: 0, yMm: 0, zMm: 200 + lifted / 100, speedMmS: null }],
    drawn: { xMm: 0, yMm: 0, angleDeg: 0 },
    footprintMm: null,
    blocksMm: [],
    grid: { originMm: [-500, -500], stepMm: 50, columns: 20, rows: 20 },
    turnsDeg: [0],
    risersMm: [0],
    ...change,
  });
}

/** Computes in this very process. */
export const inProcess: StudyComputer = {
  computeSlice: async (task) => computeSlice(task),
  answerStudy: async (task) => answerStudy(task),
};

/** The slice jobs of a study that the queue holds, whatever became of them, oldest attempt first. */
export async function sliceJobs(studyId: string): Promise<StudySliceJob[]> {
  const rows = await sequelize.query<{ data: StudySliceJob }>(
    `SELECT data FROM ${QUEUE_SCHEMA}.job WHERE name = $1 AND data ->> 'studyId' = $2
     ORDER BY (data ->> 'attempt')::int, (data ->> 'index')::int`,
    { bind: [studySliceJob.name, studyId], type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.data);
}

/** Does every queued slice once, as a worker would. */
export async function runSlices(studyId: string): Promise<void> {
  for (const job of await sliceJobs(studyId)) await runStudySlice(job, inProcess);
}
