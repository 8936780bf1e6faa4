import type { Transaction } from 'sequelize';
import type { Item, Robot } from '@/lib/layout/items';
import { inTransaction } from '@/lib/server/database';
import { storedItemsOf } from '@/lib/server/layouts/data';
import { createProject } from '@/lib/server/projects/create-project';
import { postRemark } from '@/lib/server/remarks/post-remark';
import { postReply } from '@/lib/server/remarks/post-reply';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { Layout, Project, Revision } from '@/models';
import { VIEWER_PROJECT } from '../base/people';
import type { SeedContext } from '../context';
import { addHall, addVariant, addVariantFrom, armNamed } from './build';
import type { Place } from './items';
import { finishMaps } from './maps';
import {
  PLACES,
  PUMP_HALL,
  pumpRobot,
  pumpStations,
  R1_STEPS,
  R2_STEPS,
  robotsApart,
  working,
} from './pump-line-items';

const ISSUED_LETTER = 'C';

const isRobot = (item: Item, name: string): item is Robot => item.kind === 'robot' && item.name === name;

const moved = (item: Item, [xMm, yMm, angleDeg]: Place): Item => ({ ...item, xMm, yMm, angleDeg });

async function addProject({ planner }: SeedContext['brackwater'], transaction: Transaction): Promise<void> {
  const request = { name: VIEWER_PROJECT, customerName: 'Quillfen Pumps', siteName: 'Hall 2, bay 4' };
  const project = await createProject(planner, request, transaction);
  const floorPlan = await addHall(planner, project.id, PUMP_HALL, transaction);
  const armId = await armNamed(planner, 'Six-axis 12 kg, 1.4 m', transaction);
  const { alone, r1, r2FaceToFace, r2TurnedIn } = PLACES;

  const stations = pumpStations();
  const first = working(pumpRobot('R1', armId, alone), R1_STEPS, stations);
  const a = await addVariant(
    planner,
    project.id,
    { name: 'one robot', floorPlanId: floorPlan.id, items: [first, ...stations] },
    transaction,
  );
  const faceToFace = (items: Item[]): Item[] => [
    ...items.filter((item) => isRobot(item, 'R1')).map((item) => moved(item, r1)),
    { ...working(pumpRobot('R2', armId, r2FaceToFace), R2_STEPS, items), order: 0.5 },
    { ...robotsApart(r1[0], r2FaceToFace[0]), order: items.length },
  ];
  const b = await addVariantFrom(planner, a, 'robots face to face', faceToFace, transaction);
  const turnedIn = (items: Item[]): Item[] =>
    items.flatMap((item): Item[] => {
      if (isRobot(item, 'R2')) return [moved(item, r2TurnedIn)];
      if (item.kind === 'dimension' && item.name === 'Robots apart')
        return [{ ...item, toMm: [r2TurnedIn[0] - r1[0], 0] }];
      return [];
    });
  await addVariantFrom(planner, b, 'R2 turned in', turnedIn, transaction);
}

/** Issues the last variant, and lets both sides remark on it. */
async function issueAndRemark(
  { planner, integrator, viewer }: SeedContext['brackwater'],
  layout: Layout,
  transaction: Transaction,
): Promise<void> {
  const note = 'R2 moved in by 300 mm and turned, so that both deburring points are reached.';
  const { id } = await issueRevision(integrator, layout.id, { note }, transaction);
  const items = (await storedItemsOf(layout.id, transaction)).map(({ item }) => item);
  const remarkOn = async (actor: typeof planner, name: string, offset: readonly [number, number], body: string) => {
    const item = items.find((candidate) => candidate.name === name);
    if (!item) throw new Error(`There is no ${name} in the demo layout`);
    const [xMm, yMm] = [item.xMm + offset[0], item.yMm + offset[1]];
    return postRemark({ actor }, id, { xMm, yMm, itemId: item.id, body }, transaction);
  };
  await remarkOn(planner, 'Infeed tray', [-420, -120], 'Infeed tray may turn up to 15°.');
  // The viewer's account is let in only after this; who writes here is let in for the moment.
  const customer = { ...viewer, projectIds: [layout.projectId] };
  const worry = 'Our maintenance cart needs 900 mm behind the deburr stand.';
  const remark = await remarkOn(customer, 'Deburr stand', [120, 760], worry);
  const answer = 'Understood. The guard can move out by 250 mm there; we will show it in the next revision.';
  await postReply({ actor: planner }, remark.id, { body: answer }, transaction);
}

/** The project that the product is shown with. Adds what is missing and changes nothing that is there. */
export async function seedPumpLine({ brackwater }: SeedContext): Promise<void> {
  const { planner } = brackwater;
  const where = { organisationId: planner.organisationId, name: VIEWER_PROJECT };
  if ((await Project.count({ where })) === 0) {
    await inTransaction((transaction) => addProject(brackwater, transaction));
  }
  const project = await Project.findOne({ where, rejectOnEmpty: true });
  const layout = await Layout.findOne({ where: { projectId: project.id, letter: ISSUED_LETTER } });
  if (!layout || (await Revision.count({ where: { layoutId: layout.id } })) > 0) return;
  // A revision freezes the maps that are finished when it is issued, and no worker runs yet.
  await finishMaps(planner, layout);
  await inTransaction((transaction) => issueAndRemark(brackwater, layout, transaction));
}
