import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { POST as ask } from '@/app/api/studies/route';
import { GET as read } from '@/app/api/studies/[studyId]/route';
import { POST as cancel } from '@/app/api/studies/[studyId]/cancel/route';
import { POST as retry } from '@/app/api/studies/[studyId]/retry/route';
import { problemSchema } from '@/lib/contracts/common';
import { studySchema } from '@/lib/contracts/studies';
import { sequelize } from '@/lib/server/database';
import { failStudy } from '@/lib/server/studies/fail-study';
import { storedInputSchema } from '@/lib/server/studies/question';
import { runStudySlice, storeSlice } from '@/lib/server/studies/run-slice';
import { answerStudy, computeSlice } from '@/lib/server/studies/compute';
import { Study, StudySlice } from '@/models';
import { callRoute, createArm, createMember, type TestMember } from '@/tests/factories';
import { inProcess, newStudyQuestion, runSlices, sliceJobs } from './support/study-jobs';

let planner: TestMember;
let colleague: TestMember;
let armId: string;

beforeAll(async () => {
  planner = await createMember('planner');
  colleague = await createMember('integrator', { organisationId: planner.organisationId });
  armId = (await createArm({ organisationId: planner.organisationId })).id;
});
afterAll(() => sequelize.close());

async function askAs(member: TestMember, body: unknown) {
  const response = await callRoute(ask, { as: member, method: 'POST', path: '/api/studies', body });
  const json: unknown = await response.json();
  return { status: response.status, json, study: studySchema.safeParse(json).data };
}

async function call(handler: typeof read, studyId: string, method = 'GET') {
  const path = `/api/studies/${studyId}`;
  const response = await callRoute(handler, { as: planner, method, path, params: { studyId } });
  return { status: response.status, json: (await response.json()) as unknown };
}

/** Several slices: many turns of a grid. */
const sliced = () => newStudyQuestion(armId, { turnsDeg: Array.from({ length: 12 }, (_, index) => 30 * index - 180) });
const tolerance = (trials = 200) => {
  const { tool, wrist, robot, points } = newStudyQuestion(armId);
  const errors = { placeMm: 2, turnDeg: 0.1, levelDeg: 0.1 };
  return { study: 'tolerance', armId, tool, wrist, robot, points, ...errors, trials, seed: 1 };
};

describe('a study', () => {
  it('is answered by its slices, and then at once for everybody who asks the same', async () => {
    const question = sliced();
    const asked = await askAs(planner, question);
    expect(asked).toMatchObject({ status: 202, study: { state: 'queued', answer: null } });
    expect(asked.study!.progress.total).toBeGreaterThan(1);
    await runSlices(asked.study!.id);

    const again = await askAs(colleague, question);
    expect(again).toMatchObject({ status: 200, study: { id: asked.study!.id, state: 'done', failure: null } });
    const input = storedInputSchema.parse((await Study.findByPk(asked.study!.id))!.input);
    const here = computeSlice({ ...input, from: 0, to: 20 });
    if ('fault' in here) throw new Error(here.fault);
    expect(again.study!.answer).toEqual(answerStudy({ ...input, slices: [here.slice] }));
    expect(await StudySlice.count({ where: { studyId: asked.study!.id } })).toBe(0);
  });

  it('shows how far it is', async () => {
    const { study } = await askAs(planner, sliced());
    const [first] = await sliceJobs(study!.id);
    await runStudySlice(first, inProcess);
    expect((await call(read, study!.id)).json).toMatchObject({ state: 'running', progress: { done: 1 } });
  });

  it('of an installation tolerance is answered as well', async () => {
    const { study } = await askAs(planner, tolerance());
    await runSlices(study!.id);
    expect((await call(read, study!.id)).json).toMatchObject({
      state: 'done',
      answer: { trials: 200, kept: 200, share: 1 },
    });
  });

  it('of the error gain is answered as well', async () => {
    const { tool, wrist, robot, grid } = newStudyQuestion(armId);
    const aim = { toolHeightMm: 300, tiltDeg: 0, towards: 'outward', headingDeg: 0, rollDeg: 'free' };
    const errors = { turnErrorDeg: 0.02, slideErrorMm: 0.1 };
    const { study } = await askAs(planner, { study: 'errorGain', armId, tool, wrist, robot, grid, ...aim, ...errors });
    await runSlices(study!.id);
    const { json } = await call(read, study!.id);
    const { answer } = studySchema.parse(json);
    expect(answer?.study === 'errorGain' && answer.values).toHaveLength(400);
    expect(answer?.study === 'errorGain' && answer.median).toBeGreaterThan(0);
  });

  it('is cancelled, and what still comes changes nothing; asked again it starts anew', async () => {
    const question = sliced();
    const { study } = await askAs(planner, question);
    const [job] = await sliceJobs(study!.id);
    expect((await call(cancel, study!.id, 'POST')).json).toMatchObject({ state: 'cancelled' });
    const input = storedInputSchema.parse((await Study.findByPk(study!.id))!.input);
    const late = computeSlice({ ...input, from: 0, to: 1 });
    if ('fault' in late) throw new Error(late.fault);
    expect(await storeSlice(job, input, late.slice, inProcess)).toBe(false);

    expect((await askAs(planner, question)).study).toMatchObject({ id: study!.id, state: 'queued' });
    // A worker of the first attempt comes back: the fence keeps it out of the second.
    expect(await storeSlice(job, input, late.slice, inProcess)).toBe(false);
    await runSlices(study!.id);
    const finished = await call(cancel, study!.id, 'POST');
    expect([finished.status, problemSchema.parse(finished.json).code]).toEqual([409, 'study_finished']);
  });

  it('that failed says why and can be tried again', async () => {
    const { study } = await askAs(planner, newStudyQuestion(armId));
    const [job] = await sliceJobs(study!.id);
    await failStudy(job, 'It went wrong.');
    expect((await call(read, study!.id)).json).toMatchObject({ state: 'failed', failure: 'It went wrong.' });
    expect((await call(retry, study!.id, 'POST')).json).toMatchObject({ state: 'queued', failure: null });
    await runSlices(study!.id);
    expect((await call(read, study!.id)).json).toMatchObject({ state: 'done' });
  });

  it('does not depend on which of two equal arms was named', async () => {
    const question = newStudyQuestion(armId);
    const first = await askAs(planner, question);
    const twin = await createArm({ organisationId: planner.organisationId });
    expect((await askAs(planner, { ...question, armId: twin.id })).study!.id).toBe(first.study!.id);
  });

  it('is refused in plain words where it asks too much or nothing', async () => {
    const grid = { originMm: [0, 0], stepMm: 5, columns: 2000, rows: 2000 };
    const tooMuch = await askAs(planner, newStudyQuestion(armId, { grid, turnsDeg: [0, 90, 180] }));
    expect(tooMuch.status).toBe(422);
    expect(JSON.stringify(tooMuch.json)).toContain('Choose a coarser step');
    const nothing = await askAs(planner, { ...newStudyQuestion(armId), points: [] });
    expect(nothing.status).toBe(422);
    expect(JSON.stringify(nothing.json)).toContain('Put one on a fixture first');
  });
});
