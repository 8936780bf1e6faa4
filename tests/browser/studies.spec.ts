import { expect, test, type Page } from '@playwright/test';
import { PLANNER, signIn } from './support/people';
import { createProject, DEMO_PROJECT, newVariant, openVariant } from './support/projects';
import { Sheet } from './support/sheet';

const tab = (page: Page, name: string) => page.getByRole('tab', { name: new RegExp(`^${name}`) });

test('a standing map finds a better place for a base, puts it there in one step, and takes it back', async ({
  page,
}) => {
  await signIn(page, PLANNER);
  await openVariant(page, DEMO_PROJECT, /R2 turned in/);
  const sheet = new Sheet(page);
  await tab(page, 'Studies').click();
  await page.locator('[data-ask-standing]').click();
  const answer = page.locator('[data-standing-answer]');
  await expect(answer).toBeVisible({ timeout: 80_000 });
  const cells = await answer
    .getByRole('row', { name: /Worst 1\/κ/ })
    .getByRole('cell')
    .allInnerTexts();
  const [drawn, best] = cells.map(Number);
  expect(best).toBeGreaterThan(drawn);
  await expect(page.locator('[data-study-legend="standing"]')).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/standing-map.png' });

  const x = await answer
    .getByRole('row', { name: /^x, mm/ })
    .getByRole('cell')
    .allInnerTexts();
  await page.locator('[data-put-there]').click();
  await expect(page.locator('[data-put-there]')).toHaveText(/stands there/);
  await sheet.row('R1').click();
  await tab(page, 'Readings').click();
  await expect(sheet.values.getByLabel('x', { exact: true }).first()).toHaveValue(x[1]);
  // One step: one undo brings the drawn place back.
  await page.keyboard.press('Control+z');
  await expect(sheet.values.getByLabel('x', { exact: true }).first()).toHaveValue(x[0]);
});

test('installation tolerance and clearance are told for the demo cell', async ({ page }) => {
  await signIn(page, PLANNER);
  await openVariant(page, DEMO_PROJECT, /R2 turned in/);
  await tab(page, 'Studies').click();
  await page.getByLabel('Trials').fill('100');
  await page.getByLabel('Trials').press('Enter');
  await page.locator('[data-ask-tolerance]').click();
  await expect(page.locator('[data-tolerance-answer]')).toContainText('of 100 trials', { timeout: 80_000 });
  await expect(page.locator('[data-clearance="R1"]')).toBeVisible({ timeout: 30_000 });
});

test('a light curtain asks for its times before it tells a distance; spaces are drawn', async ({ page }) => {
  await signIn(page, PLANNER);
  await createProject(page, `Distances ${Date.now()}`);
  await newVariant(page, 'with a curtain');
  const sheet = new Sheet(page);
  await sheet.placeRobot('Six-axis 12 kg, 1.4 m', 4500, 3000);
  await page.locator('button[data-tool="protectiveDevice"]').click();
  await sheet.click(1500, 2000);
  await sheet.click(1500, 4000);
  await page.keyboard.press('Enter');
  const stop = page.getByLabel('Machine stops within');
  await expect(stop).toBeVisible();
  await expect(page.locator('[data-protective="asks"]')).toBeVisible();
  for (const [label, value] of [
    ['Machine stops within', '0.15'],
    ['Device and control', '0'],
    ['Detects from (d)', '30'],
  ]) {
    await page.getByLabel(label).fill(value);
    await page.getByLabel(label).press('Enter');
  }
  // ISO 13855:2010 at right angles: T 0.15 s, d 30 mm gives 428 mm.
  await expect(page.locator('[data-protective="428"]')).toBeVisible();
  await sheet.saved();

  await tab(page, 'Distances').click();
  await page.getByLabel(/Maximum space/).click();
  await expect(page.getByText(/risk assessment/).first()).toBeVisible();
  await expect(page.locator('[data-device]')).toContainText('S = 428 mm');
  await page.screenshot({ path: 'test-results/pictures/distances-1440.png' });
  await page.setViewportSize({ width: 390, height: 844 });
  // The panel that was open stays open in the drawer of a narrow page.
  await expect(page.getByRole('heading', { name: 'Protective devices' })).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/distances-390.png' });
});
