import { expect, test } from '@playwright/test';
import { INTEGRATOR, signIn } from './support/people';
import { createProject, newVariant } from './support/projects';
import { Sheet } from './support/sheet';

test('from an empty sheet to the share link by clicks, without a single drag', async ({ page }) => {
  test.setTimeout(270_000);
  // A button held while the pointer moves would be a drag: the page itself watches that there is none.
  await page.addInitScript(() => {
    let down: { x: number; y: number } | null = null;
    window.addEventListener('pointerdown', (event) => (down = { x: event.clientX, y: event.clientY }), true);
    window.addEventListener('pointerup', () => (down = null), true);
    window.addEventListener(
      'pointermove',
      (event) => {
        if (down && Math.hypot(event.clientX - down.x, event.clientY - down.y) > 4) {
          document.documentElement.dataset.dragged = 'true';
        }
      },
      true,
    );
  });
  await signIn(page, INTEGRATOR);
  await createProject(page, `By clicks ${Date.now()}`);
  await newVariant(page, 'by clicks');
  const sheet = new Sheet(page);
  const take = (tool: string) => page.locator(`button[data-tool="${tool}"]`).click();

  await page.locator('button[data-tool="robot"]').click();
  await page.getByRole('menuitem', { name: 'Six-axis 12 kg' }).click();
  await sheet.click(3000, 3000);
  await expect(sheet.row('R1')).toContainText('x 3000 y 3000');
  await take('fixture');
  await sheet.click(4000, 3500);
  await expect(sheet.row('Fixture A')).toBeVisible();
  await take('taskPoint');
  await sheet.click(4000, 3500);
  await page.keyboard.press('Escape');
  await take('guardLine');
  for (const [x, y] of [
    [1000, 1000],
    [6000, 1000],
    [6000, 5000],
    [1000, 5000],
    [1000, 1000],
  ] as const)
    await sheet.click(x, y);
  await expect(page.locator('[data-item-kind="guardLine"]')).toHaveCount(1);

  // Picked up by a button, put down by a click far from anything that it would snap to; Escape puts back.
  await sheet.row('R1').click();
  await page.getByRole('button', { name: 'Pick up R1' }).click();
  await sheet.click(2500, 4300);
  await expect(sheet.row('R1')).toContainText('x 2500 y 4300');
  await page.getByRole('button', { name: 'Pick up R1' }).click();
  const away = await sheet.at(5000, 1500);
  await page.mouse.move(away.x, away.y);
  await page.keyboard.press('Escape');
  await expect(sheet.row('R1')).toContainText('x 2500 y 4300');
  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect(sheet.row('R1')).toContainText('x 3000 y 3000');

  // Copied here, pasted on another variant at the same place.
  await sheet.row('Fixture A').click();
  await page.getByRole('button', { name: 'Edit', exact: true }).click();
  await page.getByRole('menuitem', { name: 'Copy' }).click();
  await page.getByRole('button', { name: 'Edit', exact: true }).click();
  await page.getByRole('menuitem', { name: 'Paste' }).click();
  await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(2);
  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(1);

  await sheet.mapsDone();
  await expect(page.getByText('Draft, saved')).toBeVisible();
  const sheetAddress = page.url();
  await page.getByRole('button', { name: 'Issue for review' }).click();
  await page.getByRole('button', { name: /^Issue revision/ }).click();
  await expect(page).toHaveURL(/\/revisions\//);
  await page.goto(sheetAddress);
  await page.getByRole('button', { name: 'Share' }).click();
  await page.getByLabel('For whom').fill('Quillfen, plant manager');
  await page.getByRole('button', { name: 'Make a link' }).click();
  await expect(page.getByLabel('Address')).toHaveValue(/\/share\/[\w-]{43}$/);
  expect(await page.locator('html').getAttribute('data-dragged')).toBe(null);
});
