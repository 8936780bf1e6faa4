import { readFileSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { PATCH } from '@/app/api/floor-plans/[floorPlanId]/route';
import { POST } from '@/app/api/projects/[projectId]/floor-plans/route';
import { floorPlanSchema, FLOOR_PLAN_MAX_BYTES } from '@/lib/contracts/floor-plans';
import { problemSchema } from '@/lib/contracts/common';
import { pictureToFloor } from '@/lib/layout/calibrate';
import { getObject } from '@/lib/server/object-store';
import { FloorPlan, type Project } from '@/models';
import { callRoute, createMember, createProject, type TestMember } from '@/tests/factories';
import { animatedPng, pngDeclaring } from './support/bad-pictures';
import { storedKeys } from './support/stored-keys';
import { callUpload, upload, uploadForm } from './support/upload';

type Point = [number, number];
interface Truth {
  w: number;
  h: number;
  mmPerPx: number;
  bay_left_bottom: Point;
  bay_right_bottom: Point;
  bay_right_top: Point;
}

const folder = path.resolve('tests/fixtures/floor-plans');
const fixture = (name: string): Buffer => readFileSync(path.join(folder, name));
/** Source: truth.json, drawn together with the plans. Pixels of the upright picture; the bay is 9000 × 5700 mm. */
const truth = JSON.parse(fixture('truth.json').toString()) as Record<string, Truth>;

let planner: TestMember;
let project: Project;
beforeAll(async () => {
  planner = await createMember('planner');
  project = await createProject({ organisationId: planner.organisationId });
});

describe.each(['plan-clean.png', 'plan-negative.webp', 'plan-scan.jpg'])('%s', (name) => {
  const plan = truth[name];

  it('is stored upright, in our own encoding, at every display size', async () => {
    const response = await upload(POST, { as: planner, projectId: project.id, file: { name, bytes: fixture(name) } });
    expect(response.status).toBe(201);
    const floorPlan = floorPlanSchema.parse(await response.json());
    expect(floorPlan).toMatchObject({ widthPx: plan.w, heightPx: plan.h, name: name.split('.')[0], calibration: null });
    expect(floorPlan.pictureWidths).toEqual([...[1024, 2048].filter((width) => width < plan.w), plan.w]);

    const { objectPrefix } = await FloorPlan.findByPk(floorPlan.id, { rejectOnEmpty: true });
    for (const width of floorPlan.pictureWidths) {
      const object = await getObject(`${objectPrefix}/${width}`);
      const head = await sharp(object?.body).metadata();
      expect(head.width).toBe(width);
      expect(Math.abs(head.height - (plan.h * width) / plan.w)).toBeLessThanOrEqual(0.5);
      expect([head.exif, head.icc, head.xmp, head.orientation]).toEqual([undefined, undefined, undefined, undefined]);
      expect(object?.contentType).toBe(`image/${head.format}`);
    }
  });

  it('is calibrated on one side of the bay and checked on the other within half a percent', async () => {
    const uploaded = await upload(POST, { as: planner, projectId: project.id, file: { name, bytes: fixture(name) } });
    const { id } = floorPlanSchema.parse(await uploaded.json());
    const response = await callRoute(PATCH, {
      as: planner,
      method: 'PATCH',
      params: { floorPlanId: id },
      body: {
        calibration: {
          scale: { fromPx: plan.bay_left_bottom, toPx: plan.bay_right_bottom, distanceMm: 9000 },
          check: { fromPx: plan.bay_right_bottom, toPx: plan.bay_right_top, distanceMm: 5700 },
          level: { fromPx: plan.bay_left_bottom, toPx: plan.bay_right_bottom },
          originPx: plan.bay_left_bottom,
        },
      },
    });
    const { calibration } = floorPlanSchema.parse(await response.json());
    if (!calibration) throw new Error('No calibration came back');
    expect(Math.abs(calibration.checkError ?? 1)).toBeLessThanOrEqual(0.005);
    const [xMm, yMm] = pictureToFloor(calibration, plan.bay_right_top);
    expect(Math.hypot(xMm - 9000, yMm - 5700)).toBeLessThan(15);
  });
});

describe('a refused upload', () => {
  async function expectRefused(response: Response, status: number, code: string, remedy: RegExp): Promise<void> {
    expect(response.status).toBe(status);
    const problem = problemSchema.parse(await response.json());
    expect(problem.code).toBe(code);
    expect(problem.detail).toMatch(remedy);
  }

  /** A project of its own organisation, in which nothing may be left. */
  async function emptyProject(): Promise<{ as: TestMember; projectId: string; expectEmpty: () => Promise<void> }> {
    const as = await createMember('planner');
    const { id: projectId } = await createProject({ organisationId: as.organisationId });
    const expectEmpty = async () => {
      expect(await FloorPlan.count({ where: { projectId } })).toBe(0);
      expect(await storedKeys(`floor-plans/${as.organisationId}/`)).toEqual([]);
    };
    return { as, projectId, expectEmpty };
  }

  const blank = () => sharp({ create: { width: 8, height: 8, channels: 3, background: 'white' } });
  const frames = Buffer.from(Array.from({ length: 8 * 16 * 3 }, (_, index) => (index < 8 * 8 * 3 ? 255 : 0)));

  const cases: [string, () => Promise<Uint8Array> | Uint8Array, number, string, RegExp][] = [
    [
      'a text under the name of a picture',
      () => Buffer.from('not a picture'),
      415,
      'file_type',
      /Export the floor plan/,
    ],
    ['a PDF', () => Buffer.from('%PDF-1.7\n%âãÏÓ\n'), 415, 'file_type', /PDF\. Export the page as PNG/],
    ['a GIF', () => blank().gif().toBuffer(), 415, 'file_type', /GIF\. Save it as PNG/],
    [
      'an SVG',
      () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'),
      415,
      'file_type',
      /Export the floor plan/,
    ],
    ['an empty file', () => new Uint8Array(), 400, 'file_empty', /0 bytes.*upload it/],
    ['a bomb', () => pngDeclaring(60_000, 60_000), 413, 'picture_too_large', /60,000 × 60,000.*Save it smaller/],
    ['one pixel row too many', () => pngDeclaring(10_000, 5001), 413, 'picture_too_large', /50 million/],
    ['a PNG with no pixels behind its head', () => pngDeclaring(400, 300), 422, 'picture_damaged', /save it again/],
    ['half a PNG', () => fixture('plan-clean.png').subarray(0, 20_000), 422, 'picture_damaged', /cut short/],
    ['half a JPEG', () => fixture('plan-scan.jpg').subarray(0, 90_000), 422, 'picture_damaged', /cut short/],
    ['half a WebP', () => fixture('plan-negative.webp').subarray(0, 15_000), 422, 'picture_damaged', /cut short/],
    ['the first bytes of a JPEG', () => fixture('plan-scan.jpg').subarray(0, 12), 422, 'picture_damaged', /cut short/],
    [
      'an animated WebP',
      () =>
        sharp(frames, { raw: { width: 8, height: 16, channels: 3, pageHeight: 8 } })
          .webp()
          .toBuffer(),
      422,
      'picture_animated',
      /one still frame/,
    ],
    [
      'an animated PNG',
      async () => animatedPng(await blank().png().toBuffer()),
      422,
      'picture_animated',
      /still frame/,
    ],
  ];

  it.each(cases)('%s', async (_what, bytes, status, code, remedy) => {
    const { as, projectId, expectEmpty } = await emptyProject();
    const response = await upload(POST, { as, projectId, file: { name: 'plan.png', bytes: await bytes() } });
    await expectRefused(response, status, code, remedy);
    await expectEmpty();
  });

  it('without a file, or with something else than a form', async () => {
    const { as, projectId, expectEmpty } = await emptyProject();
    await expectRefused(await upload(POST, { as, projectId, name: 'Hall' }), 400, 'file_missing', /Choose a PNG/);
    const json = await callUpload(POST, { as, projectId }, '{}', { 'content-type': 'application/json' });
    await expectRefused(json, 400, 'file_missing', /Choose a PNG/);
    await expectEmpty();
  });

  it('that broke off on the way', async () => {
    const { as, projectId, expectEmpty } = await emptyProject();
    const whole = new Response(uploadForm({ file: { name: 'plan.png', bytes: fixture('plan-clean.png') } }));
    const contentType = whole.headers.get('content-type') ?? '';
    const half = (await whole.arrayBuffer()).slice(0, 9000);
    const response = await callUpload(POST, { as, projectId }, half, { 'content-type': contentType });
    await expectRefused(response, 400, 'upload_broken', /upload the file again/);
    await expectEmpty();
  });

  it('of more than 40 MB, told by its length before it is read', async () => {
    const { as, projectId, expectEmpty } = await emptyProject();
    const response = await callUpload(POST, { as, projectId }, uploadForm({ name: 'Hall' }), {
      'content-length': String(FLOOR_PLAN_MAX_BYTES * 2),
    });
    await expectRefused(response, 413, 'file_too_large', /40 MB/);
    await expectEmpty();
  });

  it('of more than 40 MB whose length lies, without reading it to its end', async () => {
    const { as, projectId, expectEmpty } = await emptyProject();
    const boundary = 'a-boundary';
    const head = `--${boundary}\r\ncontent-disposition: form-data; name="file"; filename="plan.png"\r\n\r\n`;
    const megabyte = new Uint8Array(1024 * 1024);
    let sent = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull(controller) {
        controller.enqueue(sent === 0 ? new TextEncoder().encode(head) : megabyte);
        sent += 1;
      },
    });
    const response = await callUpload(POST, { as, projectId }, endless, {
      'content-type': `multipart/form-data; boundary=${boundary}`,
      'content-length': '2000',
    });
    await expectRefused(response, 413, 'file_too_large', /40 MB/);
    expect(sent).toBeLessThan(60);
    await expectEmpty();
  });

  it('leaves nothing behind when the database fails after the pictures are stored', async () => {
    const { as, projectId, expectEmpty } = await emptyProject();
    const failing = vi.spyOn(FloorPlan, 'create').mockRejectedValueOnce(new Error('The database is gone'));
    const file = { name: 'plan.png', bytes: await blank().png().toBuffer() };
    const response = await upload(POST, { as, projectId, file });
    expect(failing).toHaveBeenCalledOnce();
    failing.mockRestore();
    expect(response.status).toBe(500);
    await expectEmpty();
  });
});
