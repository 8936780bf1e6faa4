import { expect, type Page } from '@playwright/test';

type Pixel = readonly [number, number];

/** On screen one picture pixel is at least this large when a point is clicked. */
const AIMING_ZOOM = 1.5;

async function numberOf(page: Page, name: string): Promise<number> {
  return Number(await page.getByTestId('calibration-picture').getAttribute(name));
}

async function screenOf(page: Page, [x, y]: Pixel): Promise<{ x: number; y: number; zoom: number }> {
  const box = await page.getByTestId('calibration-picture').boundingBox();
  if (!box) throw new Error('The picture is not on the screen.');
  const zoom = await numberOf(page, 'data-picture-zoom');
  return {
    x: box.x + (await numberOf(page, 'data-picture-left')) + x * zoom,
    y: box.y + (await numberOf(page, 'data-picture-top')) + y * zoom,
    zoom,
  };
}

/** Zooms in on a pixel with the wheel, as a careful planner would, and clicks it; then shows the whole picture again. */
async function pick(page: Page, handle: string, pixel: Pixel): Promise<void> {
  const select = page.getByRole('button', { name: `Select: ${handle}` });
  if ((await select.getAttribute('aria-pressed')) !== 'true') await select.click();
  for (let turn = 0; turn < 20; turn++) {
    const { x, y, zoom } = await screenOf(page, pixel);
    if (zoom >= AIMING_ZOOM) break;
    await page.mouse.move(x, y);
    await page.mouse.wheel(0, -200);
    await expect.poll(() => numberOf(page, 'data-picture-zoom')).not.toBe(zoom);
  }
  const { x, y } = await screenOf(page, pixel);
  await page.mouse.click(x, y);
  await page.getByRole('button', { name: 'Show the whole picture' }).click();
}

interface CalibrationPlan {
  scale: { from: Pixel; to: Pixel; distanceMm: number };
  check: { from: Pixel; to: Pixel; distanceMm: number };
  level?: { from: Pixel; to: Pixel };
  origin: Pixel;
}

async function openStep(page: Page, title: string): Promise<void> {
  // The step's own button starts with its number; its points' buttons name it too.
  const step = page.getByRole('button', { name: new RegExp(`^\\d ${title}`) });
  if ((await step.getAttribute('aria-expanded')) !== 'true') await step.click();
}

/** Sets a picture to scale with the pointer, line by line. */
export async function calibrate(page: Page, plan: CalibrationPlan): Promise<void> {
  await expect(page.getByTestId('calibration-picture')).toHaveAttribute('data-picture-shown', 'true');
  await openStep(page, 'Known distance');
  await pick(page, 'First point of the known distance', plan.scale.from);
  await pick(page, 'Second point of the known distance', plan.scale.to);
  await page.getByLabel('Distance on the floor').fill(String(plan.scale.distanceMm));
  await openStep(page, 'Check distance');
  await pick(page, 'First point of the check distance', plan.check.from);
  await pick(page, 'Second point of the check distance', plan.check.to);
  await page.getByLabel('Distance on the floor').fill(String(plan.check.distanceMm));
  if (plan.level) {
    await openStep(page, 'Level line');
    await pick(page, 'Left point of the level line', plan.level.from);
    await pick(page, 'Right point of the level line', plan.level.to);
  }
  await openStep(page, 'Origin');
  await pick(page, 'Origin', plan.origin);
}

/** The error of the check as shown, as a share. */
export async function shownCheckError(page: Page): Promise<number> {
  const text = await page.getByTestId('check-error').innerText();
  const percent = text.replace('−', '-').match(/[-+]?\d+(\.\d+)?/)?.[0];
  if (percent === undefined) throw new Error(`No error is shown: "${text}"`);
  return Number(percent) / 100;
}
