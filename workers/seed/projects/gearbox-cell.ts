import { guardLineSchema, type Item } from '@/lib/layout/items';
import { inTransaction } from '@/lib/server/database';
import { createProject } from '@/lib/server/projects/create-project';
import { Project } from '@/models';
import type { SeedContext } from '../context';
import { addHall, addVariant, armNamed } from './build';
import type { Hall } from './draw-hall';
import { at, fixture, robot } from './items';

/** All invented. */
const GEARBOX_HALL: Hall = {
  left: 0,
  right: 6000,
  near: 0,
  far: 4800,
  aisle: 1350,
  door: { x: 600, width: 1000 },
  title: 'Tarnbeck Drives, hall 1, dimensions in mm',
};

const NAME = 'Gearbox sorting cell';

const stations = (armId: string): Item[] => [
  robot('R1', armId, [3000, 2900, 90], 700),
  fixture(
    'Gear tray',
    [3000, 3330, 0],
    [500, 360, 760],
    [
      ['Tray 1', -140, 0, 800],
      ['Tray 2', 140, 0, 800],
    ],
    10,
  ),
  fixture('Gauge', [3430, 2800, 0], [240, 240, 780], [['Gauge 1', 0, 0, 820, { dwellS: 1 }]], 20),
  guardLineSchema.parse({
    kind: 'guardLine',
    name: 'Perimeter guard',
    ...at([2000, 1900, 0]),
    pointsMm: [
      [0, 0],
      [2000, 0],
      [2000, 2000],
      [0, 2000],
    ],
  }),
];

/** A small project of the other organisation, so that it can be seen that neither sees the other's. */
export async function seedGearboxCell({ osterlode: { integrator } }: SeedContext): Promise<void> {
  const where = { organisationId: integrator.organisationId, name: NAME };
  if ((await Project.count({ where })) > 0) return;
  await inTransaction(async (transaction) => {
    const request = { name: NAME, customerName: 'Tarnbeck Drives', siteName: 'Hall 1' };
    const project = await createProject(integrator, request, transaction);
    const floorPlan = await addHall(integrator, project.id, GEARBOX_HALL, transaction);
    const items = stations(await armNamed(integrator, 'SCARA 5 kg, 0.6 m', transaction));
    const settings = { toolHeightMm: 800, stepMm: 10 };
    const variant = { name: 'tray in front', floorPlanId: floorPlan.id, items, settings };
    await addVariant(integrator, project.id, variant, transaction);
  });
}
