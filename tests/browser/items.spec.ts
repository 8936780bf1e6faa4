import { expect, test, type Page } from '@playwright/test';
import { PLANNER, signIn } from './support/people';
import { createProject, newVariant } from './support/projects';
import { Sheet } from './support/sheet';

const take = (page: Page, tool: string) => page.locator(`button[data-tool="${tool}"]`).click();

async function chooseInList(sheet: Sheet, name: string | RegExp): Promise<void> {
  await sheet.row(name).first().click();
}

test('a planner draws every kind of thing by clicks, edits an outline and keeps a fixture for the next sheet', async ({
  page,
}) => {
  test.setTimeout(150_000);
  await signIn(page, PLANNER);
  await createProject(page, `Kinds of things ${Date.now()}`);
  await newVariant(page, 'all kinds');
  const sheet = new Sheet(page);
  const chosen = sheet.values.locator('[data-inspector]');
  const value = (label: string) => sheet.values.getByLabel(label, { exact: true }).first();
  const set = async (label: string, words: string) => {
    await value(label).fill(words);
    await value(label).press('Enter');
  };
  // Something large first, and the view on it, so that every later spot is on the screen.
  await take(page, 'guardLine');
  for (const [x, y] of [
    [0, 0],
    [6000, 0],
    [6000, 4000],
    [0, 4000],
  ])
    await sheet.click(x, y);
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'Show the whole sheet' }).click();
  await expect(page.locator('[data-item-kind="guardLine"]')).toHaveCount(1);

  await test.step('doors, columns, conveyors, notes, sections and walkways are placed by clicks', async () => {
    await chooseInList(sheet, 'Guard line 1');
    await sheet.values.getByRole('button', { name: 'Add a door' }).click();
    await set('From the first corner', '2500');
    await set('Door width', '99999');
    await expect(sheet.values.getByRole('alert')).toContainText(/20000 mm|beyond the line/);
    await page.keyboard.press('Escape');
    await expect(value('Door width')).toHaveValue('1000');

    await take(page, 'column');
    await sheet.click(5500, 3500);
    await take(page, 'conveyor');
    await sheet.click(500, 3500);
    await sheet.click(2500, 3500);
    await page.keyboard.press('Enter');
    await set('Speed, 0 where not known', '180');
    await take(page, 'note');
    await sheet.click(500, 2900);
    await sheet.values.getByLabel('Words of the note').fill('Housings in,\none every 40 s');
    await sheet.values.getByLabel('Words of the note').press('Control+Enter');
    await take(page, 'sectionLine');
    await sheet.click(500, 1500);
    await sheet.click(5500, 1500);
    await take(page, 'fixture');
    await sheet.click(3500, 2500);
    for (const kind of ['conveyor', 'note', 'sectionLine', 'fixture', 'obstacle'])
      await expect(page.locator(`[data-item-kind="${kind}"]`)).toHaveCount(1);
    await expect(sheet.row('Column 1')).toHaveCount(1);
    await expect(sheet.row('Section A–A')).toHaveCount(1);
  });

  await test.step('Escape drops what is under way', async () => {
    await take(page, 'conveyor');
    await sheet.click(3000, 700);
    await page.keyboard.press('Escape');
    await page.keyboard.press('Escape');
    await expect(page.locator('[data-canvas]')).toHaveAttribute('data-tool', 'select');
    await expect(page.locator('[data-item-kind="conveyor"]')).toHaveCount(1);
  });

  await test.step('a dimension follows what it measures and stays when that is deleted', async () => {
    await take(page, 'dimension');
    await sheet.click(3500, 2500);
    await sheet.click(5500, 3500);
    await sheet.click(4500, 2000);
    await expect(sheet.values.getByText(/Follows Fixture A and Column 1/)).toBeVisible();
    await expect(sheet.row('Dimension 1')).toContainText('2236 mm');
    await chooseInList(sheet, 'Fixture A');
    await set('x', '2500');
    await expect(sheet.row('Dimension 1')).toContainText('3162 mm');
    await chooseInList(sheet, 'Column 1');
    await sheet.values.getByRole('button', { name: /^Delete Column 1/ }).click();
    await chooseInList(sheet, 'Dimension 1');
    await expect(sheet.values.getByText('Follows Fixture A', { exact: true })).toBeVisible();
    await expect(sheet.row('Dimension 1')).toContainText('3162 mm');
    await page.keyboard.press('Control+z');
    await chooseInList(sheet, 'Dimension 1');
    await expect(sheet.values.getByText(/Follows Fixture A and Column 1/)).toBeVisible();
  });

  await test.step('an outline gets a corner by two clicks, loses it by Delete, and refuses to cross itself', async () => {
    await chooseInList(sheet, 'Fixture A');
    await expect(value('Width')).toHaveValue('1000');
    // The fixture lies about (2500, 2500), 1000 × 700: take the middle of its right side, put it down farther right.
    await sheet.click(3000, 2500);
    await expect(page.locator('[data-canvas]')).toHaveAttribute('data-tool', 'outline');
    await sheet.click(3300, 2500);
    await expect(value('Corner 3, x')).toHaveValue('800');
    await sheet.drag([3300, 2500], [1900, 2300]);
    await expect(value('Corner 3, x')).toHaveValue('800');
    await expect(page.getByText(/of the outline cross/).first()).toBeAttached();
    await set('Corner 1, x', 'wide');
    await expect(sheet.values.getByRole('alert')).toContainText(/is no length/);
    await page.keyboard.press('Escape');
    await sheet.click(3300, 2500);
    await page.keyboard.press('Delete');
    await expect(sheet.values.getByLabel('Corner 5, x')).toHaveCount(0);
    await sheet.values.getByRole('radio', { name: 'Rectangle' }).click();
    await expect(value('Width')).toHaveValue('1000');
  });

  await test.step('a task point is placed, aimed by its knob and numbered', async () => {
    await take(page, 'taskPoint');
    await sheet.click(2400, 2600);
    await sheet.click(2700, 2400);
    await page.keyboard.press('Escape');
    await chosen.getByRole('button', { name: /^Fixture A 1/ }).click();
    await set('Wanted speed', '250');
    await set('Tilt from down', '45');
    await expect(value('Tilt from down')).toHaveValue('45');
  });

  await test.step('the fixture goes to the library and comes back as a copy with its points', async () => {
    const name = `Drawer tray ${Date.now()}`;
    await sheet.values.getByRole('button', { name: 'Save to the library' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Name in the library').fill(name);
    await dialog.getByRole('button', { name: 'Save to the library' }).click();
    await expect(dialog).toHaveCount(0);
    await take(page, 'ownFixture');
    await page.getByRole('menuitem', { name: new RegExp(name) }).click();
    await sheet.click(4500, 900);
    await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(2);
    await expect(value('x')).toHaveValue('4500');
    await expect(chosen.getByRole('button', { name: /^Fixture A [12]/ })).toHaveCount(2);

    await take(page, 'ownFixture');
    await page.getByRole('menuitem', { name: 'Rename or delete…' }).click();
    await page.getByRole('button', { name: `Delete ${name}` }).click();
    await page.getByRole('button', { name: 'Delete it' }).click();
    await expect(page.getByRole('button', { name: `Delete ${name}` })).toHaveCount(0);
    await page.getByRole('button', { name: 'Close' }).click();
    await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(2);
  });

  await sheet.saved();
  await page.reload();
  await expect(page.locator('[data-item-kind]')).toHaveCount(8);
});
