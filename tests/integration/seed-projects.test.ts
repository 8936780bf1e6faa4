import { beforeAll, describe, expect, it } from 'vitest';
import { makePostureAnalyser, makeSolver, reach } from '@/lib/kinematics';
import { itemToFloor } from '@/lib/layout/geometry';
import type { Item, Robot, TaskPoint } from '@/lib/layout/items';
import { armWithTool, directionToBase, floorToBase } from '@/lib/layout/robot-frame';
import { toolDirection } from '@/lib/layout/tool-orientation';
import { readLayout, listLayouts } from '@/lib/server/layouts/read-layouts';
import { createOrganisation } from '@/lib/server/organisations/create-organisation';
import { inTransaction } from '@/lib/server/database';
import type { MemberActor } from '@/lib/server/policy';
import { listProjects } from '@/lib/server/projects/data';
import { readRevisionRemarks } from '@/lib/server/remarks/read-remarks';
import { readRevision } from '@/lib/server/revisions/read-revisions';
import { snapshotHash } from '@/lib/server/revisions/snapshot';
import { FloorPlan, Layout, LayoutItem, Project, Remark, Revision } from '@/models';
import { createMember, unique } from '@/tests/factories';
import type { SeedContext } from '@/workers/seed/context';
import { seedProjects } from '@/workers/seed/projects';

/** People and arms of the test's own, so that it does not meet other tests of the seed. */
async function newContext(): Promise<SeedContext> {
  const organisation = async () =>
    (await inTransaction((transaction) => createOrganisation(unique('Demo'), transaction))).id;
  const [brackwater, osterlode] = [await organisation(), await organisation()];
  const actor = async (role: MemberActor['role'], organisationId: string) =>
    (await createMember(role, { organisationId })).actor;
  return {
    brackwater: {
      organisationId: brackwater,
      planner: await actor('planner', brackwater),
      integrator: await actor('integrator', brackwater),
      admin: await actor('admin', brackwater),
      viewer: await actor('viewer', brackwater),
    },
    osterlode: { organisationId: osterlode, integrator: await actor('integrator', osterlode) },
  };
}

let context: SeedContext;
beforeAll(async () => {
  context = await newContext();
  await seedProjects(context);
}, 120_000);

const everything = { archived: 'false', search: '' } as const;

async function pumpLine() {
  const { planner } = context.brackwater;
  const [project] = await listProjects(planner, everything);
  const layouts = await listLayouts(planner, project.id);
  return { project, layouts: await Promise.all(layouts.map(({ id }) => readLayout(planner, id))) };
}

/** The best inverse condition number at a task point over robots and postures; null out of reach. */
function bestAt(
  robots: readonly Robot[],
  arms: Awaited<ReturnType<typeof readLayout>>['arms'],
  fixture: Item,
  point: TaskPoint,
) {
  const [xMm, yMm] = itemToFloor(fixture, [point.xMm, point.yMm]);
  const values = robots.flatMap((robot) => {
    const library = arms.find(({ id }) => id === robot.armId);
    if (!library) throw new Error('An arm is missing');
    const arm = armWithTool(library.definition, robot.tool);
    const [x, y, z] = floorToBase(robot, [xMm, yMm, point.zMm]);
    const direction = directionToBase(robot, toolDirection(point.tiltDeg, point.azimuthDeg + fixture.angleDeg));
    const target = { position: [x / 1000, y / 1000, z / 1000], direction, roll: 'free' } as const;
    const analyse = makePostureAnalyser(arm);
    return reach(makeSolver(arm), target).postures.map(
      ({ posture }) => analyse(posture).wristHeld.inverseConditionNumber ?? 0,
    );
  });
  return values.length > 0 ? Math.max(...values) : null;
}

describe('the demo projects', () => {
  it('are one a organisation, and neither sees the other\u2019s', async () => {
    const names = async (actor: MemberActor) => (await listProjects(actor, everything)).map(({ name }) => name);
    expect(await names(context.brackwater.planner)).toEqual(['Pump housing line, bay 4']);
    expect(await names(context.osterlode.integrator)).toEqual(['Gearbox sorting cell']);
  });

  it('have a floor plan of their own, set to scale without error', async () => {
    const { project } = await pumpLine();
    const [floorPlan] = await FloorPlan.findAll({ where: { projectId: project.id } });
    expect(floorPlan.calibration?.mmPerPx).toBe(4);
    expect(floorPlan.calibration?.checkError).toBeCloseTo(0, 12);
    expect(floorPlan.calibration?.rotationDeg).toBe(0);
  });

  it('have three variants whose verdicts differ: something out of reach, something tight, and all reached', async () => {
    const { layouts } = await pumpLine();
    expect(layouts.map(({ letter, name }) => `${letter} · ${name}`)).toEqual([
      'A · one robot',
      'B · robots face to face',
      'C · R2 turned in',
    ]);
    const verdicts = layouts.map(({ items, arms }) => {
      const all = items.map(({ item }) => item);
      const robots = all.filter((item) => item.kind === 'robot');
      return all.flatMap((item) =>
        item.kind === 'fixture'
          ? item.taskPoints.map((point) => [point.name, bestAt(robots, arms, item, point)] as const)
          : [],
      );
    });
    const outOfReach = verdicts.map((list) => list.filter(([, value]) => value === null).map(([name]) => name));
    expect(outOfReach[0]).toContain('Infeed 1');
    expect(outOfReach[1]).toEqual(['Deburr 1']);
    expect(outOfReach[2]).toEqual([]);
    // Bands of the condition number: tight is above 10 and up to 30.
    const tight = verdicts[1].filter(([, value]) => value !== null && value < 1 / 10 && value >= 1 / 30);
    expect(tight.map(([name]) => name)).toEqual(['Infeed 2']);
  });

  it('list robots first and keep ids apart between variants', async () => {
    const { layouts } = await pumpLine();
    const names = (index: number) => layouts[index].items.map(({ item }) => item.name);
    expect(names(1).slice(0, 3)).toEqual(['R1', 'R2', 'Fixture A · pump housing']);
    expect(names(2)).toEqual(names(1));
    const ids = layouts.flatMap(({ items }) => items.map(({ item }) => item.id));
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('have one issued revision with finished maps of both robots, two remarks and a reply', async () => {
    const { layouts } = await pumpLine();
    expect(layouts.map(({ latestRevision }) => latestRevision?.number ?? null)).toEqual([null, null, 1]);
    const revision = await readRevision(context.brackwater.integrator, layouts[2].latestRevision?.id ?? '');
    expect(revision.sha256).toBe(snapshotHash(revision.snapshot));
    const robots = revision.snapshot.items.filter(({ kind }) => kind === 'robot');
    expect(revision.snapshot.maps.map(({ robotId }) => robotId)).toEqual(robots.map(({ id }) => id));
    const remarks = await readRevisionRemarks({ actor: context.brackwater.planner }, revision.id);
    expect(remarks.map(({ number, author, replies }) => [number, author.side, replies.length])).toEqual([
      [1, 'integrator', 0],
      [2, 'customer', 1],
    ]);
  });

  it('are left alone by a second run', async () => {
    const organisationId = [context.brackwater.organisationId, context.osterlode.organisationId];
    const rows = async () => {
      const projects = await Project.findAll({ where: { organisationId }, order: ['id'] });
      const projectId = projects.map(({ id }) => id);
      const layouts = await Layout.findAll({ where: { projectId }, order: ['id'] });
      const layoutId = layouts.map(({ id }) => id);
      const parts = await Promise.all([
        FloorPlan.findAll({ where: { projectId }, order: ['id'] }),
        LayoutItem.findAll({ where: { layoutId }, order: ['id'] }),
        Revision.findAll({ where: { layoutId }, order: ['id'] }),
        Remark.findAll({ where: { layoutId }, order: ['id'] }),
      ]);
      return JSON.parse(JSON.stringify([projects, layouts, ...parts])) as object[][];
    };
    const before = await rows();
    expect(before.map(({ length }) => length)).toEqual([2, 4, 2, 44, 1, 2]);
    await seedProjects(context);
    expect(await rows()).toEqual(before);
  });
});
