import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { GET as layoutCycle } from '@/app/api/layouts/[layoutId]/cycle/route';
import { GET as layoutVerdicts } from '@/app/api/layouts/[layoutId]/verdicts/route';
import { GET as revisionCycle } from '@/app/api/revisions/[revisionId]/cycle/route';
import { GET as revisionVerdicts } from '@/app/api/revisions/[revisionId]/verdicts/route';
import { cycleAnswerSchema, verdictsAnswerSchema } from '@/lib/contracts/judging';
import { rectangleOutline } from '@/lib/layout/geometry';
import { fixtureSchema, robotSchema } from '@/lib/layout/items';
import { judgeItems } from '@/lib/layout/verdicts';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { callRoute, createArm, createLayout, createMember, createProject, type TestMember } from '@/tests/factories';

let planner: TestMember;
let integrator: TestMember;
let layoutId: string;
let revisionId: string;
const [near, far, pallet, seam] = Array.from({ length: 4 }, () => randomUUID());

beforeAll(async () => {
  integrator = await createMember('integrator');
  planner = await createMember('planner', { organisationId: integrator.organisationId });
  const { id: projectId } = await createProject({ organisationId: planner.organisationId });
  const arm = await createArm({ organisationId: planner.organisationId });
  const fixtureId = randomUUID();
  const place = { xMm: 0, yMm: 0, angleDeg: 0 };
  const step = (taskPointId: string) => ({ kind: 'point', id: randomUUID(), fixtureId, taskPointId });
  const items = [
    robotSchema.parse({
      kind: 'robot',
      id: randomUUID(),
      name: 'R1',
      ...place,
      armId: arm.id,
      tool: { massKg: 3 },
      sequence: [step(near), step(far), { kind: 'wait', id: randomUUID(), seconds: 1 }],
      targetCycleS: 20,
    }),
    fixtureSchema.parse({
      kind: 'fixture',
      id: fixtureId,
      name: 'Tray',
      ...place,
      outlineMm: rectangleOutline(500, 500),
      zToMm: 500,
      taskPoints: [
        { id: near, name: 'Near', xMm: 700, yMm: 0, zMm: 500, speedMmS: 100 },
        { id: far, name: 'Far', xMm: 9000, yMm: 0, zMm: 500 },
      ],
      taskPatterns: [{ id: pallet, name: 'Pallet', xMm: 600, yMm: -100, zMm: 450, rows: 2, columns: 2 }],
      taskPaths: [
        {
          id: seam,
          name: 'Seam',
          points: [
            { xMm: 700, yMm: -50, zMm: 500 },
            { xMm: 700, yMm: 50, zMm: 500 },
          ],
        },
      ],
    }),
  ];
  layoutId = (await createLayout({ projectId, items })).id;
  revisionId = (await issueRevision(integrator.actor, layoutId, { note: '' })).id;
  const judged = judgeItems(items, () => arm.definition, 'held');
  expect(judged.map(({ best }) => best!.reached)).toEqual([true, false]);
});

const ask = async (handler: Parameters<typeof callRoute>[0], params: object) => {
  const response = await callRoute(handler, { as: planner, params });
  expect(response.status).toBe(200);
  return response.json() as Promise<unknown>;
};

describe('the verdicts of a layout', () => {
  it('are told for points, paths and patterns, the worst first, with the payload and the caution', async () => {
    const answer = verdictsAnswerSchema.parse(await ask(layoutVerdicts, { layoutId }));
    expect(answer.tasks).toHaveLength(4);
    expect(answer.tasks[0]).toMatchObject({ id: far, kind: 'point', reached: false, band: 'out' });
    expect(answer.tasks.find(({ id }) => id === near)).toMatchObject({ reached: true, wantedSpeedMmS: 100 });
    expect(answer.tasks.map(({ kind }) => kind).sort()).toEqual(['path', 'pattern', 'point', 'point']);
    expect(answer.payloads[0]).toMatchObject({ robotName: 'R1', massKg: { value: 3, rated: 12, margin: 9 } });
    expect(answer.payloads[0].caution).toContain('Inertia is not checked');
    expect(answer.caution).toContain('risk assessment');
  });

  it('are the same of the revision that was issued from it', async () => {
    expect(await ask(revisionVerdicts, { revisionId })).toEqual(await ask(layoutVerdicts, { layoutId }));
  });
});

describe('the cycle of a layout', () => {
  it('names the point that is out of reach and times the rest', async () => {
    const answer = cycleAnswerSchema.parse(await ask(layoutCycle, { layoutId }));
    const [robot] = answer.robots;
    expect(robot.problems).toMatchObject([{ number: 2, label: 'Far' }]);
    expect(robot.steps.map(({ label }) => label)).toEqual(['Near', 'Grip']);
    // One point only is left to go to, so the robot stands there and waits.
    expect(robot.totalS).toBeCloseTo(1, 9);
    expect(robot.marginS).toBeCloseTo(19, 9);
    expect(answer.caution).toContain('An estimate');
    expect(await ask(revisionCycle, { revisionId })).toEqual(JSON.parse(JSON.stringify(answer)));
  });
});
