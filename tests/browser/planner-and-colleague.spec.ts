import { expect, test } from '@playwright/test';
import { INTEGRATOR, personAt, PLANNER, signIn } from './support/people';
import { createProject, newVariant } from './support/projects';
import { Sheet } from './support/sheet';

test('a planner draws a cell, sees its maps, and a colleague gets the same maps from the store', async ({
  page,
  browser,
}) => {
  await signIn(page, PLANNER);
  await createProject(page, 'Two arms and four fixtures');
  await newVariant(page, 'first idea');
  const sheet = new Sheet(page);

  await sheet.placeRobot('Six-axis 12 kg', 2000, 2000);
  await sheet.placeRobot('SCARA 5 kg', 4500, 2000);
  for (const [x, y] of [
    [1200, 3200],
    [2800, 3200],
    [4500, 2600],
    [2000, 900],
  ] as const)
    await sheet.placeFixture(x, y);
  await expect(page.locator('[data-item-kind="robot"]')).toHaveCount(2);
  await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(4);

  // A task point by keyboard: the fixture is chosen, the palette's row places it at once.
  await sheet.row('Fixture').first().click();
  await page.locator('button[data-tool="taskPoint"]').focus();
  await page.keyboard.press('Enter');
  await expect(sheet.values.getByRole('table').first()).toBeVisible();

  await sheet.mapsDone();
  await sheet.saved();

  // Undo and redo of a drag come back to the same values.
  const robot = sheet.row('R1');
  await robot.click();
  const before = await robot.innerText();
  await sheet.drag([2000, 2000], [2300, 2200]);
  await expect(robot).not.toHaveText(before);
  const after = await robot.innerText();
  await page.keyboard.press('Control+z');
  await expect.poll(() => robot.innerText()).toBe(before);
  await page.keyboard.press('Control+Shift+z');
  await expect.poll(() => robot.innerText()).toBe(after);
  await sheet.mapsDone();
  await sheet.saved();

  await page.reload();
  await expect(sheet.row('R1')).toContainText(after.split('\n').at(-1) ?? '');
  await expect(page.locator('[data-item-kind="fixture"]')).toHaveCount(4);

  // The colleague's answers come at once, finished: no job is waited for.
  const colleague = await personAt(browser, INTEGRATOR);
  const asked: number[] = [];
  colleague.page.on('response', (response) => {
    if (new URL(response.url()).pathname === '/api/maps') asked.push(response.status());
  });
  await colleague.page.goto(page.url());
  await new Sheet(colleague.page).mapsDone();
  expect(asked).toHaveLength(2);
  expect(asked).toEqual([200, 200]);
  await colleague.context.close();
});

test('two planners on one sheet see each other’s edits, and a stale one is shown, not lost', async ({
  page,
  browser,
}) => {
  await signIn(page, PLANNER);
  await createProject(page, 'Two planners');
  await newVariant(page, 'shared');
  const mine = new Sheet(page);
  await mine.placeFixture(1000, 1000);
  await mine.saved();

  const other = await personAt(browser, INTEGRATOR);
  await other.page.goto(page.url());
  const theirs = new Sheet(other.page);
  await theirs.row('Fixture').first().click();

  // Mine is kept back on the wire until theirs is in.
  let release = () => {};
  const held = new Promise<void>((resolve) => (release = resolve));
  await page.route('**/operations', async (route) => {
    await held;
    await route.continue();
  });
  await mine.row('Fixture').first().click();
  await mine.type({ x: 1500 });
  await theirs.type({ x: 2500 });
  await theirs.saved();
  release();
  await expect(page.getByText(/changed/i).first()).toBeVisible();
  await expect(page.getByRole('button', { name: /conflict|choose|compare both|look/i }).first()).toBeVisible();
  await other.context.close();
});
