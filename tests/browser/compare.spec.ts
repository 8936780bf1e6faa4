import { expect, test } from '@playwright/test';
import { INTEGRATOR, signIn } from './support/people';
import { DEMO_PROJECT, openVariant } from './support/projects';

test('an integrator compares two variants, map against map and number against number', async ({ page }) => {
  await signIn(page, INTEGRATOR);
  await openVariant(page, DEMO_PROJECT, /robots face to face/);
  await page.getByRole('link', { name: 'Compare' }).click();
  await expect(page).toHaveURL(/\/compare\?left=layout:/);
  await page.getByRole('button', { name: /^Right sheet/ }).click();
  await page.getByRole('menuitemradio', { name: 'Draft, as it is now' }).last().click();
  await expect(page).toHaveURL(/right=layout/);
  const numbers = page.getByRole('table', { name: /^Numbers of/ });
  await expect(numbers.getByRole('row', { name: /Task points met/ })).toContainText('8 of 9');
  await expect(numbers.getByRole('row', { name: /Task points met/ })).toContainText('9 of 9');
  await expect(page.getByText(/Drawn as soon as all maps/)).toHaveCount(0, { timeout: 60_000 });
  await expect(page.getByRole('table', { name: 'Things that differ between the two sheets' })).toContainText('R2');
  await expect(page.getByText(/hatched: won/)).toBeVisible();
  await page.waitForLoadState('networkidle');
  await page.screenshot({ path: 'test-results/pictures/compare-1440.png' });
  await page.setViewportSize({ width: 390, height: 844 });
  await page.screenshot({ path: 'test-results/pictures/compare-390.png' });
});
