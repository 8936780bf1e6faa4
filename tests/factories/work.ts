import { nextLetter } from '@/lib/server/layouts/letters';
import { randomUUID } from 'node:crypto';
import type { ArmContent, LibraryArm } from '@/lib/contracts/arms';
import type { Snapshot } from '@/lib/contracts/revisions';
import { snapshotHash } from '@/lib/server/revisions/snapshot';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { robotSchema } from '@/lib/layout/items';
import type { Item } from '@/lib/layout/items';
import { Arm, FloorPlan, Layout, LayoutItem, Project } from '@/models';
import { unique } from './counter';
import { createOrganisation } from './people';

interface ProjectOptions {
  organisationId?: string;
  createdBy?: string;
  name?: string;
}

export async function createProject(options: ProjectOptions = {}): Promise<Project> {
  const organisationId = options.organisationId ?? (await createOrganisation()).id;
  const name = options.name ?? unique('Project');
  return Project.create({ organisationId, name, createdBy: options.createdBy ?? null });
}

/** The row only: nothing lies in the object store. */
export async function createFloorPlan(options: { projectId?: string } = {}): Promise<FloorPlan> {
  const projectId = options.projectId ?? (await createProject()).id;
  return FloorPlan.create({
    projectId,
    name: unique('Floor plan'),
    widthPx: 1000,
    heightPx: 800,
    objectPrefix: `floor-plans/${randomUUID()}`,
    originalMediaType: 'image/png',
    originalBytes: 1000,
    pictureWidths: [1000],
  });
}

interface LayoutOptions {
  projectId?: string;
  createdBy?: string;
  name?: string;
  items?: Item[];
}

export async function createLayout(options: LayoutOptions = {}): Promise<Layout> {
  const projectId = options.projectId ?? (await createProject()).id;
  const given = await Layout.findAll({ where: { projectId }, attributes: ['letter'] });
  const letter = nextLetter(given.map((layout) => layout.letter));
  const layout = await Layout.create({
    projectId,
    letter: letter ?? 'A',
    name: options.name ?? unique('Variant'),
    mapSettings: mapSettingsSchema.parse({}),
    createdBy: options.createdBy ?? null,
  });
  for (const item of options.items ?? []) {
    const row = { layoutId: layout.id, id: item.id, version: 1, kind: item.kind, data: item, layoutVersion: 0 };
    await LayoutItem.create(row);
  }
  return layout;
}

/** A six-axis arm with a spherical wrist; invented figures. */
const definition: LibraryArm['definition'] = {
  convention: 'standard',
  joints: [
    {
      type: 'revolute',
      a: 0.15,
      alpha: -Math.PI / 2,
      d: 0.45,
      theta: 0,
      min: -2.9,
      max: 2.9,
      maxSpeed: 4,
      maxAcceleration: 12,
    },
    {
      type: 'revolute',
      a: 0.6,
      alpha: 0,
      d: 0,
      theta: -Math.PI / 2,
      min: -1.8,
      max: 2.4,
      maxSpeed: 3.5,
      maxAcceleration: 10,
    },
    {
      type: 'revolute',
      a: 0.12,
      alpha: -Math.PI / 2,
      d: 0,
      theta: 0,
      min: -3.6,
      max: 1.2,
      maxSpeed: 4,
      maxAcceleration: 12,
    },
    {
      type: 'revolute',
      a: 0,
      alpha: Math.PI / 2,
      d: 0.62,
      theta: 0,
      min: -3.3,
      max: 3.3,
      maxSpeed: 7,
      maxAcceleration: 20,
    },
    {
      type: 'revolute',
      a: 0,
      alpha: -Math.PI / 2,
      d: 0,
      theta: 0,
      min: -2.1,
      max: 2.1,
      maxSpeed: 7,
      maxAcceleration: 20,
    },
    { type: 'revolute', a: 0, alpha: 0, d: 0.1, theta: 0, min: -6.2, max: 6.2, maxSpeed: 10, maxAcceleration: 30 },
  ],
};

interface ArmOptions {
  organisationId?: string;
  familyId?: string;
  version?: number;
  name?: string;
}

export async function createArm(options: ArmOptions = {}): Promise<Arm> {
  return Arm.create({
    organisationId: options.organisationId ?? (await createOrganisation()).id,
    familyId: options.familyId ?? randomUUID(),
    version: options.version ?? 1,
    name: options.name ?? unique('Six-axis 12 kg, 1.4 m'),
    payloadKg: 12,
    reachMm: 1400,
    definition,
  });
}

/** What a request says of an arm; `part` in place of the usual. */
export function armContent(part: Partial<ArmContent> = {}): ArmContent {
  return { name: unique('Arm'), description: '', payloadKg: 12, definition, ...part };
}

export function robotItem(armId: string): Item {
  return robotSchema.parse({ kind: 'robot', id: randomUUID(), name: 'R1', xMm: 0, yMm: 0, angleDeg: 0, armId });
}

/** What a revision of an empty layout freezes; `parts` are put in place of the empty ones. */
export function emptySnapshot(layout: Layout, parts: Partial<Snapshot> = {}): { snapshot: Snapshot; sha256: string } {
  const snapshot: Snapshot = {
    format: 1,
    projectName: 'Project',
    customerName: 'Customer',
    letter: layout.letter,
    name: layout.name,
    layoutVersion: layout.version,
    items: [],
    arms: [],
    floorPlan: null,
    mapSettings: layout.mapSettings,
    maps: [],
    ...parts,
  };
  // Of plain JSON; the product's own hash is of canonical JSON.
  return { snapshot, sha256: snapshotHash(snapshot) };
}
