import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { z } from 'zod';
import { rectangleOutline } from '@/lib/layout/geometry';
import { itemSchema, type Item } from '@/lib/layout/items';

export interface ManyItems {
  /** Its page, with the host. */
  readonly address: string;
  readonly robotAtMm: readonly [number, number];
  readonly fixtureAtMm: readonly [number, number];
  remove(): Promise<void>;
}

const layoutSchema = z.looseObject({
  id: z.string(),
  projectId: z.string(),
  items: z.array(z.looseObject({ item: z.looseObject({ kind: z.string(), xMm: z.number(), yMm: z.number() }) })),
});

/** A variant made from a sheet that has robots, with items added until there are `count`. They stand in rows beside its cell. */
export async function manyItems(page: Page, count: number): Promise<ManyItems> {
  const ask = async (method: string, path: string, body?: unknown): Promise<unknown> =>
    page.evaluate(
      async ([how, where, what]) => {
        const answer = await fetch(where, {
          method: how,
          ...(what && { body: what, headers: { 'content-type': 'application/json' } }),
        });
        if (!answer.ok) throw new Error(`${how} ${where}: ${answer.status}`);
        return answer.status === 204 ? null : answer.json();
      },
      [method, path, body === undefined ? '' : JSON.stringify(body)] as const,
    );
  const { projectId, id: cellId } = await cellWithRobots(ask);
  // One that an interrupted run has left.
  const { layouts } = layoutsSchema.parse(await ask('GET', `/api/projects/${projectId}/layouts`));
  for (const { id, name } of layouts) if (name === NAME) await ask('DELETE', `/api/layouts/${id}`);
  const made = z
    .looseObject({ id: z.string() })
    .parse(await ask('POST', `/api/projects/${projectId}/layouts`, { name: NAME, copyOf: cellId }));
  const layout = layoutSchema.parse(await ask('GET', `/api/layouts/${made.id}`));
  const placed = rows(count - layout.items.length);
  const operations = placed.map((item) => ({ type: 'put', baseVersion: 0, item }));
  await ask('POST', `/api/layouts/${made.id}/operations`, { id: randomUUID(), operations });
  const robot = layout.items.find(({ item }) => item.kind === 'robot')?.item;
  if (!robot) throw new Error('The sheet has no robot to drag.');
  return {
    address: `${new URL(page.url()).origin}/projects/${projectId}/layouts/${made.id}`,
    robotAtMm: [robot.xMm, robot.yMm],
    fixtureAtMm: [placed[0].xMm, placed[0].yMm],
    remove: async () => void (await ask('DELETE', `/api/layouts/${made.id}`)),
  };
}

const NAME = 'For timing';

type Ask = (method: string, path: string, body?: unknown) => Promise<unknown>;

const projectsSchema = z.looseObject({ projects: z.array(z.looseObject({ id: z.string() })) });
const layoutsSchema = z.looseObject({
  layouts: z.array(z.looseObject({ id: z.string(), name: z.string(), itemCount: z.number() })),
});

async function cellWithRobots(ask: Ask): Promise<z.infer<typeof layoutSchema>> {
  for (const project of projectsSchema.parse(await ask('GET', '/api/projects')).projects) {
    const { layouts } = layoutsSchema.parse(await ask('GET', `/api/projects/${project.id}/layouts`));
    for (const { id, itemCount } of layouts) {
      if (itemCount < 5 || itemCount > 100) continue;
      const layout = layoutSchema.parse(await ask('GET', `/api/layouts/${id}`));
      if (layout.items.filter(({ item }) => item.kind === 'robot').length > 1) return layout;
    }
  }
  throw new Error('No sheet with two robots: seed the demo first.');
}

const COLUMNS = 25;
const PITCH_MM = 900;

/** Fixtures with a task point each, obstacles, and walkways, in the share of a real hall. */
function rows(count: number): Item[] {
  return Array.from({ length: count }, (_, index) => {
    const at = { xMm: (index % COLUMNS) * PITCH_MM, yMm: 8000 + Math.floor(index / COLUMNS) * PITCH_MM };
    const common = { id: randomUUID(), ...at, angleDeg: (index * 7) % 90, order: 100 + index };
    if (index % 10 === 9) {
      const pointsMm = [
        [0, 0],
        [PITCH_MM, 0],
      ];
      return itemSchema.parse({ ...common, kind: 'walkway', name: `Walkway ${index}`, pointsMm, widthMm: 300 });
    }
    const body = { ...common, outlineMm: rectangleOutline(500, 350), zToMm: 800 };
    if (index % 3 > 0) return itemSchema.parse({ ...body, kind: 'obstacle', name: `Obstacle ${index}` });
    const point = { id: randomUUID(), name: `Point ${index}`, xMm: 0, yMm: 0, zMm: 800 };
    return itemSchema.parse({ ...body, kind: 'fixture', name: `Fixture ${index}`, taskPoints: [point] });
  });
}
