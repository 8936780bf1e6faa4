import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { expect, test, type Download, type Page } from '@playwright/test';
import DxfParser from 'dxf-parser';
import { INTEGRATOR, signIn } from './support/people';
import { createProject, DEMO_PROJECT, openProject } from './support/projects';

async function saved(page: Page, press: () => Promise<void>): Promise<{ download: Download; path: string }> {
  const coming = page.waitForEvent('download');
  await press();
  const download = await coming;
  return { download, path: await download.path() };
}

test('an integrator hands a variant over as PDF, DXF and JSON, and takes the JSON in again', async ({ page }) => {
  test.setTimeout(170_000);
  await signIn(page, INTEGRATOR);
  await openProject(page, DEMO_PROJECT);
  const sheet = page.getByRole('link', { name: /robots face to face/ }).first();
  await page.goto(`${await sheet.getAttribute('href')}/hand-over`);
  await expect(page.getByText('need a risk assessment').first()).toBeVisible({ timeout: 60_000 });

  await page.getByRole('button', { name: 'Make the PDF' }).click();
  const report = page.getByRole('listitem').filter({ hasText: 'PDF report, A4' }).first();
  const fetchPdf = report.getByRole('button', { name: /^Download/ });
  await expect(fetchPdf).toBeVisible({ timeout: 90_000 });
  const pdf = await saved(page, () => fetchPdf.click());
  expect(pdf.download.suggestedFilename()).toMatch(/-B-draft-A4\.pdf$/);
  const text = execFileSync('pdftotext', ['-layout', pdf.path, '-'], { encoding: 'utf8' });
  for (const words of [DEMO_PROJECT, 'Verdicts', 'Deburr 2', 'Assumptions', 'Cautions', 'risk assessment']) {
    expect(text).toContain(words);
  }

  const dxf = await saved(page, () => page.getByRole('button', { name: 'Download: Linework as DXF' }).click());
  const drawing = new DxfParser().parseSync(readFileSync(dxf.path, 'utf8'));
  expect(drawing?.entities.some(({ layer }) => layer === 'ROBOTS')).toBe(true);

  const json = await saved(page, () => page.getByRole('button', { name: 'Download: Layout as JSON' }).click());
  await page.waitForLoadState('networkidle');
  await page.screenshot({ path: 'test-results/pictures/hand-over-1440.png' });
  await page.setViewportSize({ width: 390, height: 844 });
  await page.screenshot({ path: 'test-results/pictures/hand-over-390.png' });
  await page.setViewportSize({ width: 1440, height: 900 });

  // Into another project: what it lacks comes along.
  await createProject(page, `Handed over ${Date.now()}`);
  await page.getByRole('button', { name: 'Import' }).first().click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Layout file').setInputFiles({
    name: 'cut.json',
    mimeType: 'application/json',
    buffer: readFileSync(json.path).subarray(0, 5000),
  });
  await expect(dialog.getByText(/damaged: it stops being JSON at line \d+, column \d+/)).toBeVisible();
  await dialog.getByLabel('Layout file').setInputFiles(json.path);
  await expect(page).toHaveURL(/\/layouts\/[0-9a-f-]{36}$/, { timeout: 60_000 });

  // The imported variant gives the very same file.
  await page.goto(`${page.url()}/hand-over`);
  const again = await saved(page, () => page.getByRole('button', { name: 'Download: Layout as JSON' }).click());
  expect(readFileSync(again.path, 'utf8')).toBe(readFileSync(json.path, 'utf8'));
});
