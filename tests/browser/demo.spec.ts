import { expect, test } from '@playwright/test';
import { PLANNER, signIn, STRANGER, VIEWER } from './support/people';
import { DEMO_PROJECT, openProject, openVariant } from './support/projects';
import { Sheet } from './support/sheet';

test('the demo sheet shows its cell, its maps and its verdicts', async ({ page }) => {
  await signIn(page, PLANNER);
  await openVariant(page, DEMO_PROJECT, /robots face to face/);
  const sheet = new Sheet(page);
  await sheet.mapsDone();
  await expect(sheet.row('R1')).toBeVisible();
  await expect(page.getByText('Out of reach').first()).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/sheet-1440.png' });
  await page.setViewportSize({ width: 390, height: 844 });
  await expect(page.getByRole('tab', { name: 'Points' })).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/sheet-390.png' });
});

test('the plumb reads a spot: postures, speeds and what binds', async ({ page }) => {
  await signIn(page, PLANNER);
  await openVariant(page, DEMO_PROJECT, /robots face to face/);
  const sheet = new Sheet(page);
  await sheet.mapsDone();
  await page.locator('button[data-tool="plumb"]').click();
  await sheet.click(4400, 4600);
  await expect(page.getByText(/Plumb at/)).toBeVisible();
  await expect(sheet.values.getByText('Inverse condition number')).toBeVisible();
  await expect(sheet.values.getByText(/m\/s/).first()).toBeVisible();
});

test('the customer with an account sees issued revisions of their own project, and nothing of others', async ({
  page,
}) => {
  await signIn(page, VIEWER);
  await openProject(page, DEMO_PROJECT);
  await expect(page.getByRole('button', { name: 'New variant' })).toHaveCount(0);
  await page.getByRole('link', { name: /^rev /i }).first().click();
  await expect(page).toHaveURL(/\/revisions\//);
  await expect(page.getByText(/risk assessment/i).first()).toBeVisible();
});

test('another organisation sees only its own work', async ({ page }) => {
  await signIn(page, STRANGER);
  await page.goto('/projects');
  await expect(page.getByRole('link', { name: DEMO_PROJECT })).toHaveCount(0);
  await expect(page.getByRole('table')).toBeVisible();
});
