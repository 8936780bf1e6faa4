import { readFileSync } from 'node:fs';
import { expect, test, type Page } from '@playwright/test';
import { INTEGRATOR, PLANNER, signIn } from './support/people';
import { createProject, newVariant } from './support/projects';
import { Sheet } from './support/sheet';

const unique = (name: string): string => `${name} ${Date.now().toString(36)}`;

async function openArm(page: Page, name: string): Promise<void> {
  await page.goto('/arms');
  await page.getByRole('link', { name, exact: true }).click();
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();
}

/** The whole section is mapped in its small cells. */
async function sectionDone(page: Page): Promise<void> {
  await expect(page.getByText(/Fastest tool speed in the section: \d/)).toBeVisible({ timeout: 60_000 });
}

test('an integrator edits an arm: a bad limit is refused in words, a new version is saved, the sheet keeps the old one', async ({
  page,
}) => {
  // From the library to a sheet and back, twice.
  test.slow();
  await signIn(page, INTEGRATOR);
  const name = unique('Bench arm');
  await openArm(page, 'Six-axis 12 kg, 1.4 m');
  await page.getByRole('button', { name: 'Copy', exact: true }).click();
  await page.getByLabel('Name of the copy').fill(name);
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();

  await createProject(page, unique('Arm trial'));
  await newVariant(page, 'With the first version');
  const sheetUrl = page.url();
  const sheet = new Sheet(page);
  await sheet.placeRobot(name, 1000, 1000);
  await sheet.saved();

  await openArm(page, name);
  const from = page.getByLabel('Joint 3, Lower limit');
  await from.fill('95');
  const words = 'Joint 3 starts at 95° and ends at 75°. The start must be below the end.';
  await expect(page.getByText(words)).toBeVisible();
  const save = page.getByRole('button', { name: 'Save as version 2' });
  await expect(save).toBeDisabled();
  await sectionDone(page);
  await page.screenshot({ path: 'test-results/pictures/arm-1440.png' });
  await from.fill('-190');
  await from.press('Enter');
  await expect(page.getByLabel('Joint 4, Lower limit')).toBeFocused();
  await expect(page.getByText(words)).toHaveCount(0);
  await page.getByLabel('Name', { exact: true }).fill(`${name} B`);
  await save.click();
  await expect(page.getByRole('heading', { level: 1, name: `${name} B` })).toBeVisible();
  await expect(page.getByText(/Used in 0 layouts/)).toBeVisible();
  await expect(page.getByText('Joint 3: from −195° → −190°.')).toBeVisible();

  await page.goto(sheetUrl);
  await sheet.row('R1').click();
  await expect(sheet.values.getByRole('combobox', { name: 'Arm' })).toHaveText(new RegExp(`^${name}(, version 1)?$`));
  await page.locator('button[data-tool="robot"]').click();
  await expect(page.getByRole('menuitem', { name: `${name} B` })).toBeVisible();
});

test('unsaved edits are asked about before a link takes them away', async ({ page }) => {
  await signIn(page, INTEGRATOR);
  await openArm(page, 'SCARA 5 kg, 0.6 m');
  await page.getByLabel('Joint 1, Link length a').fill('330');
  await page.getByRole('link', { name: 'Elbowroom, all projects' }).click();
  const dialog = page.getByRole('dialog', { name: 'Leave without saving?' });
  await dialog.getByRole('button', { name: 'Stay here' }).click();
  await expect(page.getByLabel('Joint 1, Link length a')).toHaveValue('330');
  await page.getByRole('link', { name: 'Elbowroom, all projects' }).click();
  await dialog.getByRole('button', { name: 'Leave and let it go' }).click();
  await expect(page).toHaveURL(/\/projects$/);
});

test('an arm goes out as a table and comes in again, with its faults named by line and column', async ({ page }) => {
  await signIn(page, INTEGRATOR);
  await openArm(page, 'SCARA 5 kg, 0.6 m');
  await page.getByRole('button', { name: 'More for this arm' }).click();
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('menuitem', { name: /as CSV/ }).click(),
  ]);
  expect(download.suggestedFilename()).toBe('SCARA 5 kg 0.6 m.csv');
  const table = readFileSync(await download.path(), 'utf8');

  await page.goto('/arms');
  await page.getByRole('link', { name: 'Import' }).click();
  const choose = (text: string) =>
    page.getByLabel('Arm file').setInputFiles({ name: 'arm.csv', mimeType: 'text/csv', buffer: Buffer.from(text) });
  await choose(table.replace(/^1,turns,325/m, '1,turns,long'));
  await expect(page.getByText(/column a\. “long” is no number/)).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/arm-import-refused-1440.png' });
  await choose(table);
  await expect(page.getByLabel('Joint 3, kind')).toHaveValue('prismatic');
  await sectionDone(page);
  await page.screenshot({ path: 'test-results/pictures/arm-import-1440.png' });
  const name = unique('SCARA from a table');
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByRole('button', { name: 'Add to the library' }).click();
  await expect(page).toHaveURL(/\/arms\/[0-9a-f-]{36}$/);
  await page.setViewportSize({ width: 390, height: 844 });
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible();
  const wide = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(wide).toBe(390);
  await page.screenshot({ path: 'test-results/pictures/arm-390.png', fullPage: true });
});

test('a planner reads an arm and finds nothing to change', async ({ page }) => {
  await signIn(page, PLANNER);
  await openArm(page, 'Six-axis 6 kg, 0.9 m');
  await sectionDone(page);
  await expect(page.getByRole('button', { name: /Save|Copy/ })).toHaveCount(0);
  await page.goto('/arms/import');
  await expect(page.getByText('Only integrators add arms')).toBeVisible();
});
