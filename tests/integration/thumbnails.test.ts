import { beforeAll, describe, expect, it } from 'vitest';
import sharp from 'sharp';
import { POST } from '@/app/api/layouts/[layoutId]/operations/route';
import { GET } from '@/app/api/layouts/[layoutId]/thumbnail/route';
import { fixtureSchema } from '@/lib/layout/items';
import { callRoute, createLayout, createMember, createProject, type TestMember } from '@/tests/factories';
import { rectangleOutline } from '@/lib/layout/geometry';
import { randomUUID } from 'node:crypto';

let planner: TestMember;
let layoutId: string;

beforeAll(async () => {
  planner = await createMember('planner');
  const project = await createProject({ organisationId: planner.organisationId });
  layoutId = (await createLayout({ projectId: project.id })).id;
});

const ask = (query: string, headers: Record<string, string> = {}) =>
  callRoute(GET, { as: planner, params: { layoutId }, path: `/?${query}`, headers });

async function place(): Promise<void> {
  const item = fixtureSchema.parse({
    kind: 'fixture',
    id: randomUUID(),
    name: 'Tray',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    outlineMm: rectangleOutline(2000, 1000),
    zToMm: 800,
  });
  const body = { id: randomUUID(), operations: [{ type: 'put', baseVersion: 0, item }] };
  const response = await callRoute(POST, { as: planner, method: 'POST', params: { layoutId }, body });
  expect(response.status).toBe(200);
}

/** How many pixels of the picture are as dark as ink. */
async function inkedPixels(response: Response): Promise<number> {
  const { data, info } = await sharp(Buffer.from(await response.arrayBuffer()))
    .greyscale()
    .raw()
    .toBuffer({ resolveWithObject: true });
  expect(info.width / info.height).toBeCloseTo(1.6, 1);
  return data.filter((value) => value < 110).length;
}

describe('the small picture of a variant', () => {
  it('is a PNG that follows the layout and need not be sent twice', async () => {
    const empty = await ask('width=160');
    expect(empty.headers.get('content-type')).toBe('image/png');
    const etag = empty.headers.get('etag') ?? '';
    expect(await inkedPixels(empty)).toBe(0);
    expect((await ask('width=160', { 'if-none-match': etag })).status).toBe(304);

    await place();
    const drawn = await ask('width=160', { 'if-none-match': etag });
    expect(drawn.status).toBe(200);
    // The outline of a rectangle across the picture: two sides of some 150 px and two of half that, at twice the density.
    expect(await inkedPixels(drawn)).toBeGreaterThan(300);
  });

  it('refuses sizes that nobody needs', async () => {
    expect((await ask('width=9000')).status).toBe(422);
  });
});
