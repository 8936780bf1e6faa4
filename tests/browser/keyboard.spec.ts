import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe';
import { Keys } from './support/keys';
import { accountOf, INTEGRATOR } from './support/people';
import { Sheet } from './support/sheet';

test('from signing in to the share link by keyboard alone, with nothing for axe to find', async ({ page }) => {
  test.setTimeout(270_000);
  const keys = new Keys(page);
  const sheet = new Sheet(page);
  const button = (name: string | RegExp) => page.getByRole('button', { name }).first();
  const value = (label: string) => sheet.values.getByLabel(label, { exact: true }).first();
  const set = async (label: string, words: string) => {
    await keys.fill(value(label), words);
    await keys.press('Enter');
  };

  await page.goto('/sign-in');
  await expectAccessible(page, 'the page to sign in');
  await keys.fill(page.getByLabel('E-mail'), INTEGRATOR);
  await keys.fill(page.getByLabel('Password', { exact: true }), accountOf(INTEGRATOR).password);
  await keys.press('Enter');
  await expect(page).toHaveURL(/\/projects/);

  await keys.activate(button(/New project|Create the first project/));
  await keys.fill(page.getByRole('dialog').getByRole('textbox', { name: 'Project' }), `By keys ${Date.now()}`);
  await keys.fill(page.getByRole('dialog').getByRole('textbox', { name: 'Customer' }), 'Quillfen Pumps');
  await expectAccessible(page, 'the dialog of a new project');
  await keys.activate(button('Create project'));
  await expect(page).toHaveURL(/\/projects\/[0-9a-f-]{36}/);
  await expect(button('New variant')).toBeVisible();
  await expectAccessible(page, 'the page of a project');
  await keys.activate(button('New variant'));
  await keys.fill(page.getByRole('dialog').getByRole('textbox', { name: 'Name' }), 'by keys');
  await expectAccessible(page, 'the dialog of a new variant');
  await keys.press('Enter');
  await expect(sheet.canvas).toBeVisible({ timeout: 30_000 });

  // A robot from the palette's menu stands in the middle of the view; its place is typed.
  await keys.activate(page.locator('button[data-tool="robot"]'));
  await expectAccessible(page, 'the menu of arms', '[role="menu"]');
  await keys.choose(page.getByRole('menuitem', { name: 'Six-axis 12 kg' }));
  await expect(sheet.row('R1')).toBeVisible();
  await set('x', '2 m');
  await set('y', '2000 + 10 mm');
  await expect(sheet.row('R1')).toContainText('x 2000 y 2010');

  // A fixture with a task point; it is moved by one step and by ten, and what was done is said.
  await keys.activate(page.locator('button[data-tool="fixture"]'));
  await expect(sheet.row('Fixture A')).toBeVisible();
  await set('x', '2500');
  await set('y', '2500');
  await keys.activate(page.locator('button[data-tool="taskPoint"]'));
  await expect(page.locator('[data-live-region]')).toHaveText(/Place Fixture A 1/);

  // Everything from the list: choose two, group them, line them up, undo, lock.
  await keys.activate(sheet.row('Fixture A'));
  await keys.press('Shift+ArrowRight');
  await expect(value('x')).toHaveValue('3000');
  await keys.press('Control+z');
  await expect(value('x')).toHaveValue('2500');
  await keys.reach(sheet.row('R1'));
  await keys.press('Shift+Enter');
  await expect(page.getByText('2 items chosen')).toBeVisible();
  await keys.press('Control+g');
  await expect(page.getByText('2 items chosen, one group')).toBeVisible();
  await keys.press('Control+Shift+g');
  await keys.activate(button('Line up lower edges'));
  await expect(page.locator('[data-live-region]')).toHaveText(/Align 2 items/);
  await keys.press('Control+z');
  await expectAccessible(page, 'the sheet with two things chosen');
  await keys.press('Escape');

  await keys.press('?');
  await expect(page.getByRole('dialog', { name: 'Keys and gestures' })).toBeVisible();
  await expectAccessible(page, 'the page of shortcuts');
  await keys.press('Escape');

  // The map, the issue, and the link.
  await sheet.mapsDone();
  await expect(page.getByText('Draft, saved')).toBeVisible();
  await expectAccessible(page, 'the sheet with its map');
  const sheetAddress = page.url();
  await keys.activate(button('Issue for review'));
  await keys.fill(page.getByLabel('Note to the reviewer'), 'Drawn without a mouse.');
  await expectAccessible(page, 'the dialog to issue');
  await keys.activate(button(/^Issue revision/));
  await expect(page).toHaveURL(/\/revisions\//);
  await expect(page.locator('canvas').first()).toBeVisible({ timeout: 30_000 });
  await expectAccessible(page, 'the page of a revision');
  await page.goto(sheetAddress);
  await keys.activate(button('Share'));
  await keys.fill(page.getByLabel('For whom'), 'Quillfen, plant manager');
  await expectAccessible(page, 'the dialog to share');
  await keys.activate(button('Make a link'));
  await expect(page.getByLabel('Address')).toHaveValue(/\/share\/[\w-]{43}$/);
});
