import { expect, test } from '@playwright/test';
import { PLANNER, signIn } from './support/people';
import { createProject } from './support/projects';

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
