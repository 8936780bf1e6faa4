import { describe, expect, it } from 'vitest';
import { GET as getArm, PATCH as changeArm } from '@/app/api/arms/[armId]/route';
import { GET as listVersions, POST as saveVersion } from '@/app/api/arms/[armId]/versions/route';
import { GET as listArms, POST as postArm } from '@/app/api/arms/route';
import { GET as getLayout } from '@/app/api/layouts/[layoutId]/route';
import { libraryArmListSchema, libraryArmSchema } from '@/lib/contracts/arms';
import { armsByIds } from '@/lib/server/arms/data';
import { createOrganisation as plantOrganisation } from '@/lib/server/organisations/create-organisation';
import { problemSchema } from '@/lib/contracts/common';
import { layoutSchema } from '@/lib/contracts/layouts';
import { AuditEvent } from '@/models';
import {
  armContent,
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  robotItem,
  unique,
} from '../factories';
import type { TestMember } from '../factories';

describe('the arm library', () => {
  it('lists every version of my organisation’s arms, and says which is the latest', async () => {
    const planner = await createMember('planner');
    const { organisationId } = planner;
    const first = await createArm({ organisationId, name: 'Arm' });
    const second = await createArm({ organisationId, name: 'Arm', familyId: first.familyId, version: 2 });
    await createArm();
    const { arms } = libraryArmListSchema.parse(await (await callRoute(listArms, { as: planner })).json());
    expect(arms.map(({ id, version, latest }) => ({ id, version, latest }))).toEqual([
      { id: second.id, version: 2, latest: true },
      { id: first.id, version: 1, latest: false },
    ]);
  });

  it('counts the layouts in which a version stands', async () => {
    const planner = await createMember('planner');
    const { organisationId } = planner;
    const arm = await createArm({ organisationId });
    const projectId = (await createProject({ organisationId })).id;
    await createLayout({ projectId, items: [robotItem(arm.id), robotItem(arm.id)] });
    await createLayout({ projectId, items: [robotItem(arm.id)] });
    const response = await callRoute(getArm, { as: planner, params: { armId: arm.id } });
    expect(libraryArmSchema.parse(await response.json()).layoutCount).toBe(2);
  });

  it('hides arms of another organisation', async () => {
    const planner = await createMember('planner');
    const foreign = await createArm();
    expect((await callRoute(getArm, { as: planner, params: { armId: foreign.id } })).status).toBe(404);
    expect(await armsByIds(planner.organisationId, [foreign.id])).toEqual([]);
  });

  it('comes planted with the built-in arms', async () => {
    const organisation = await plantOrganisation(unique('Organisation'));
    const planner = await createMember('planner', { organisationId: organisation.id });
    const { arms } = libraryArmListSchema.parse(await (await callRoute(listArms, { as: planner })).json());
    expect(arms.length).toBeGreaterThanOrEqual(2);
    for (const arm of arms) {
      expect(arm.version).toBe(1);
      // The smallest arm of the design document reaches 0.4 m, the largest 3.2 m and a gantry more.
      expect(arm.reachMm).toBeGreaterThanOrEqual(400);
      expect(arm.reachMm).toBeLessThan(10_000);
    }
  });
});

const readArm = async (response: Response) => libraryArmSchema.parse(await response.json());

async function add(as: TestMember, body: unknown): Promise<Response> {
  return callRoute(postArm, { as, method: 'POST', body });
}

async function save(as: TestMember, armId: string, body: unknown): Promise<Response> {
  return callRoute(saveVersion, { as, method: 'POST', params: { armId }, body });
}

const actionsOn = async (subjectId: string): Promise<string[]> =>
  (await AuditEvent.findAll({ where: { subjectId }, order: [['createdAt', 'ASC']] })).map(({ action }) => action);

describe('a new arm', () => {
  it('is taken in from its data, with the reach that its chain has', async () => {
    const integrator = await createMember('integrator');
    const response = await add(integrator, armContent({ name: '  Welder  ' }));
    expect(response.status).toBe(201);
    const arm = await readArm(response);
    // By hand from the data of the factory: shoulder + upper arm + √(elbow² + forearm²).
    expect(arm.reachMm).toBe(Math.round(150 + 600 + Math.hypot(120, 620)));
    expect(arm).toMatchObject({ name: 'Welder', version: 1, latest: true, layoutCount: 0, archivedAt: null });
    expect(await actionsOn(arm.id)).toEqual(['arm.created']);
  });

  it('may be a copy of any version, and goes its own way from there', async () => {
    const integrator = await createMember('integrator');
    const original = await createArm({ organisationId: integrator.organisationId });
    const copy = await readArm(await add(integrator, { copyOf: original.id, name: 'Copy' }));
    expect(copy).toMatchObject({ name: 'Copy', version: 1, definition: original.definition });
    expect(copy.familyId).not.toBe(original.familyId);
    const foreign = await createArm();
    expect((await add(integrator, { copyOf: foreign.id, name: 'Copy' })).status).toBe(404);
  });

  const swapped = armContent();
  swapped.definition = structuredClone(swapped.definition);
  swapped.definition.joints[2] = {
    ...swapped.definition.joints[2],
    min: (95 * Math.PI) / 180,
    max: (75 * Math.PI) / 180,
  };
  const withJoint = (part: object) => {
    const body = structuredClone(armContent());
    Object.assign(body.definition.joints[1], part);
    return body;
  };
  const many = structuredClone(armContent());
  many.definition.joints = Array.from({ length: 20 }, () => many.definition.joints[0]);
  const none = structuredClone(armContent());
  none.definition.joints = [];

  it.each([
    ['a start above the end', swapped, 'definition.joints.2.min', /Joint 3 starts at 95° and ends at 75°/],
    ['a speed of zero', withJoint({ maxSpeed: 0 }), 'definition.joints.1.maxSpeed', /above zero/],
    ['no number', withJoint({ a: null }), 'definition.joints.1.a', /Write a number/],
    ['twenty joints', many, 'definition.joints', /at most 12/],
    ['no joints', none, 'definition.joints', /at least one/],
    ['no name', armContent({ name: ' ' }), 'name', /Give the arm a name/],
    [
      'a chain that turns on the spot',
      armContent({
        definition: {
          convention: 'standard',
          joints: [
            {
              ...none.definition.joints[0],
              type: 'revolute',
              a: 0,
              alpha: 0,
              d: 0.1,
              theta: 0,
              min: -1,
              max: 1,
              maxSpeed: 1,
              maxAcceleration: 1,
            },
          ],
        },
      }),
      'definition.joints',
      /never leaves its first axis/,
    ],
    [
      'a copy without a name',
      { copyOf: '00000000-0000-4000-8000-000000000000', name: '' },
      'name',
      /Give the arm a name/,
    ],
  ])('with %s is refused with the field named', async (_case, body, path, words) => {
    const integrator = await createMember('integrator');
    const response = await add(integrator, body);
    expect(response.status).toBe(422);
    const { errors } = problemSchema.parse(await response.json());
    expect(errors).toContainEqual({ path, message: expect.stringMatching(words) });
  });
});

describe('versions of an arm', () => {
  it('are added on top, and layouts keep the one that they name', async () => {
    const integrator = await createMember('integrator');
    const { organisationId } = integrator;
    const first = await createArm({ organisationId });
    const projectId = (await createProject({ organisationId })).id;
    const layout = await createLayout({ projectId, items: [robotItem(first.id)] });
    const response = await save(integrator, first.id, { ...armContent({ name: 'Renamed' }), baseVersion: 1 });
    expect(response.status).toBe(201);
    const second = await readArm(response);
    expect(second).toMatchObject({
      familyId: first.familyId,
      version: 2,
      latest: true,
      layoutCount: 0,
      name: 'Renamed',
    });
    expect(await actionsOn(second.id)).toEqual(['arm.version_saved']);

    const listed = await callRoute(listVersions, { as: integrator, params: { armId: first.id } });
    const { arms } = libraryArmListSchema.parse(await listed.json());
    expect(arms.map(({ id, version, latest, layoutCount }) => ({ id, version, latest, layoutCount }))).toEqual([
      { id: second.id, version: 2, latest: true, layoutCount: 0 },
      { id: first.id, version: 1, latest: false, layoutCount: 1 },
    ]);
    const opened = await callRoute(getLayout, { as: integrator, params: { layoutId: layout.id } });
    expect(layoutSchema.parse(await opened.json()).arms).toMatchObject([
      { id: first.id, version: 1, name: first.name },
    ]);
  });

  it('refuse one that was edited from an older one, and show the newer', async () => {
    const integrator = await createMember('integrator');
    const first = await createArm({ organisationId: integrator.organisationId });
    const second = await readArm(await save(integrator, first.id, { ...armContent(), baseVersion: 1 }));
    const response = await save(integrator, first.id, { ...armContent({ payloadKg: 9 }), baseVersion: 1 });
    expect(response.status).toBe(409);
    const problem = problemSchema.loose().parse(await response.json());
    expect(problem.code).toBe('stale_arm');
    expect(libraryArmSchema.parse(problem.newest).id).toBe(second.id);
  });

  it('take one of two that are saved at the same time', async () => {
    const integrator = await createMember('integrator');
    const first = await createArm({ organisationId: integrator.organisationId });
    const both = await Promise.all(
      [5, 6].map((payloadKg) => save(integrator, first.id, { ...armContent({ payloadKg }), baseVersion: 1 })),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it('answer a repeated request with the version that it made', async () => {
    const integrator = await createMember('integrator');
    const first = await createArm({ organisationId: integrator.organisationId });
    const body = { ...armContent(), baseVersion: 1 };
    const made = await readArm(await save(integrator, first.id, body));
    expect((await readArm(await save(integrator, first.id, body))).id).toBe(made.id);
  });
});

describe('an archived arm', () => {
  it('leaves the list with all its versions, stays in layouts, takes no version and comes back', async () => {
    const integrator = await createMember('integrator');
    const { organisationId } = integrator;
    const first = await createArm({ organisationId });
    await createArm({ organisationId, familyId: first.familyId, version: 2 });
    const projectId = (await createProject({ organisationId })).id;
    const layout = await createLayout({ projectId, items: [robotItem(first.id)] });
    const change = (archived: boolean) =>
      callRoute(changeArm, { as: integrator, method: 'PATCH', params: { armId: first.id }, body: { archived } });
    const listed = async (path: string) =>
      libraryArmListSchema.parse(await (await callRoute(listArms, { as: integrator, path })).json()).arms;

    const { archivedAt } = await readArm(await change(true));
    expect(archivedAt).not.toBeNull();
    expect((await readArm(await change(true))).archivedAt).toBe(archivedAt);
    expect(await listed('/')).toEqual([]);
    expect(await listed('/?archived=true')).toHaveLength(2);
    const opened = await callRoute(getLayout, { as: integrator, params: { layoutId: layout.id } });
    expect(layoutSchema.parse(await opened.json()).arms).toMatchObject([{ id: first.id }]);
    const refused = await save(integrator, first.id, { ...armContent(), baseVersion: 2 });
    expect(problemSchema.parse(await refused.json()).code).toBe('archived_arm');

    expect((await readArm(await change(false))).archivedAt).toBeNull();
    expect(await listed('/')).toHaveLength(2);
  });
});
