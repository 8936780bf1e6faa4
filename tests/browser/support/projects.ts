import path from 'node:path';
import { expect, type Page } from '@playwright/test';

export const DEMO_PROJECT = 'Pump housing line, bay 4';

export async function createProject(page: Page, name: string): Promise<void> {
  await page.goto('/projects');
  await page
    .getByRole('button', { name: /New project|Create the first project/ })
    .first()
    .click();
  const dialog = page.getByRole('dialog');
  await dialog.getByRole('textbox', { name: 'Project' }).fill(name);
  await dialog.getByRole('textbox', { name: 'Customer' }).fill('Quillfen Pumps');
  await page.getByRole('button', { name: 'Create project' }).click();
  await expect(page).toHaveURL(/\/projects\/[0-9a-f-]{36}/);
}

export async function openProject(page: Page, name: string): Promise<void> {
  await page.goto('/projects');
  await page.getByRole('link', { name }).click();
  await expect(page).toHaveURL(/\/projects\/[0-9a-f-]{36}/);
}

export async function openVariant(page: Page, project: string, variant: string | RegExp): Promise<void> {
  await openProject(page, project);
  await page.getByRole('link', { name: variant }).first().click();
  await expect(page.locator('[data-canvas]')).toBeVisible({ timeout: 30_000 });
}

export const planFile = (name: string) => path.join('tests', 'fixtures', 'floor-plans', name);

/** Uploads through the page and waits for the plan's row. */
export async function uploadPlan(page: Page, file: string): Promise<void> {
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Upload' }).first().click(),
  ]);
  await chooser.setFiles(file);
}

export async function newVariant(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'New variant' }).click();
  await page.getByRole('dialog').getByRole('textbox', { name: 'Name' }).fill(name);
  await page.getByRole('button', { name: 'Create variant' }).click();
  await expect(page.locator('[data-canvas]')).toBeVisible({ timeout: 30_000 });
}
