import { readFileSync } from 'node:fs';
import { expect, test } from '@playwright/test';
import { calibrate, shownCheckError } from './support/calibrate';
import { findInPicture } from './support/find-in-picture';
import { PLANNER, signIn } from './support/people';
import { createProject, newVariant, planFile, uploadPlan } from './support/projects';
import { Sheet } from './support/sheet';

interface Truth {
  mmPerPx: number;
  w: number;
  h: number;
  bay_left_bottom: [number, number];
  bay_right_bottom: [number, number];
  bay_right_top: [number, number];
}

// Where the dotted bay stands in each picture, as measured by whoever drew them (truth.json beside the pictures).
const truth = JSON.parse(readFileSync(planFile('truth.json'), 'utf8')) as Record<string, Truth>;
const BAY = { length: 9000, depth: 5700 };

for (const file of ['plan-clean.png', 'plan-negative.webp', 'plan-scan.jpg']) {
  test(`${file}: uploaded, shown upright, set to scale on one side of the bay and checked on the other`, async ({
    page,
  }) => {
    const plan = truth[file];
    await signIn(page, PLANNER);
    await createProject(page, `Bay in ${file}`);
    await uploadPlan(page, planFile(file));
    await page
      .getByRole('button', { name: 'Set to scale' })
      .or(page.getByRole('link', { name: /Set to scale/ }))
      .first()
      .click();
    await expect(page.getByText(`${plan.w} × ${plan.h} px`)).toBeVisible();

    await calibrate(page, {
      scale: { from: plan.bay_left_bottom, to: plan.bay_right_bottom, distanceMm: BAY.length },
      check: { from: plan.bay_right_bottom, to: plan.bay_right_top, distanceMm: BAY.depth },
      level: { from: plan.bay_left_bottom, to: plan.bay_right_bottom },
      origin: plan.bay_left_bottom,
    });
    expect(Math.abs(await shownCheckError(page))).toBeLessThanOrEqual(0.005);
    await page.getByRole('button', { name: 'Save the scale' }).click();
    await expect(page.getByText('To scale').first()).toBeVisible();

    // A robot clicked onto the far corner of the bay, as it is seen on the sheet, reads the corner's true coordinates.
    await page.getByRole('link', { name: 'Back' }).click();
    await newVariant(page, 'Corner');
    await page.getByRole('button', { name: /^Floor plan/ }).click();
    await page.getByRole('menuitemradio').first().click();
    const sheet = new Sheet(page);
    await expect(page.getByRole('button', { name: /^Floor plan/ })).not.toContainText('none');
    // The board shows the whole picture first.
    await expect.poll(async () => sheet.shows(BAY.length, BAY.depth)).toBe(true);
    const zoom = await sheet.zoomTo(BAY.length, BAY.depth, plan.mmPerPx);
    // With a tool in hand no hint lies over the picture.
    await page.locator('button[data-tool="robot"]').click();
    await page.getByRole('menuitem', { name: /Six-axis 12 kg/ }).click();
    const seen = await findInPicture(
      page,
      planFile(file),
      plan.bay_right_top,
      await sheet.at(BAY.length, BAY.depth),
      zoom,
    );
    expect(seen.likeness).toBeGreaterThan(0.6);
    await page.keyboard.down('Alt');
    await page.mouse.move(seen.x, seen.y);
    await page.mouse.down();
    await page.mouse.up();
    await page.keyboard.up('Alt');
    const x = await sheet.values.getByLabel('x', { exact: true }).first().inputValue();
    const y = await sheet.values.getByLabel('y', { exact: true }).first().inputValue();
    expect(Math.abs(Number(x) - BAY.length)).toBeLessThanOrEqual(15);
    expect(Math.abs(Number(y) - BAY.depth)).toBeLessThanOrEqual(15);
    await page.screenshot({ path: `test-results/pictures/corner-${file}.png` });
  });
}

test('what is no picture is refused in words, and nothing is kept', async ({ page }) => {
  await signIn(page, PLANNER);
  await createProject(page, 'Refusals');
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Upload' }).first().click(),
  ]);
  await chooser.setFiles({
    name: 'plan.png',
    mimeType: 'image/png',
    buffer: Buffer.from('This is no picture at all.'),
  });
  await expect(page.getByText('plan.png was not taken in')).toBeVisible();
  await expect(page.getByText(/PNG, JPEG or WebP/).first()).toBeVisible();
  await page.reload();
  await expect(page.getByText('No floor plan yet')).toBeVisible();
});
