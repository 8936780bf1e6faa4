import { describe, expect, it } from 'vitest';
import { GET as getArm } from '@/app/api/arms/[armId]/route';
import { GET as listArms } from '@/app/api/arms/route';
import { libraryArmListSchema, libraryArmSchema } from '@/lib/contracts/arms';
import { armsByIds } from '@/lib/server/arms/data';
import { createOrganisation as plantOrganisation } from '@/lib/server/organisations/create-organisation';
import { callRoute, createArm, createLayout, createMember, createProject, robotItem, unique } from '../factories';

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
