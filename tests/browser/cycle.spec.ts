import { expect, test, type Page } from '@playwright/test';
import { PLANNER, signIn } from './support/people';
import { createProject, newVariant } from './support/projects';
import { Sheet } from './support/sheet';

const tab = (page: Page, name: string) => page.getByRole('tab', { name: new RegExp(`^${name}`) });

async function fill(page: Page, label: string, value: string): Promise<void> {
  const field = page.getByLabel(label, { exact: true }).first();
  await field.fill(value);
  await field.press('Enter');
}

test('work gets its verdicts, and a robot its cycle, timed as steps are added, moved and changed', async ({ page }) => {
  await signIn(page, PLANNER);
  await createProject(page, `Cycle ${Date.now()}`);
  await newVariant(page, 'one robot');
  const sheet = new Sheet(page);
  await sheet.placeRobot('Six-axis 12 kg, 1.4 m', 4000, 3000);
  await sheet.placeFixture(4900, 3000);

  // A point within reach and one far outside it.
  const chosen = page.getByRole('region', { name: 'What is chosen' });
  await chosen.getByRole('button', { name: 'Add', exact: true }).click();
  await fill(page, 'Name of the task point', 'Pick');
  await fill(page, 'Wanted speed', '100');
  await chosen.getByRole('button', { name: 'Add', exact: true }).click();
  await fill(page, 'Name of the task point', 'Far away');
  await fill(page, 'x in fixture', '6000');
  // A tray, and a seam with an arc in it.
  await chosen.getByRole('button', { name: 'Add to task patterns' }).click();
  await fill(page, 'Name in task patterns', 'Nests');
  await chosen.getByRole('button', { name: 'Add to task paths' }).click();
  await fill(page, 'Name in task paths', 'Bead');
  await chosen.getByLabel('An arc leads to corner 2').click();
  await fill(page, 'Wanted speed', '50');

  // The worst stands first; every kind of work has a row with a verdict.
  const rows = page.locator('[data-verdict]');
  await expect(rows).toHaveCount(4);
  await expect(rows.first()).toHaveAttribute('data-point', 'Far away');
  await expect(rows.first()).toContainText('Out of reach');
  await expect(page.locator('[data-point="Bead"]')).not.toHaveAttribute('data-verdict', 'out');
  await page.locator('[data-point="Bead"]').getByRole('button').click();
  await page.locator('[data-point="Bead"]').getByRole('button').click();
  await expect(page.getByText(/^Weakest stretch: \d+ to \d+ mm along\.$/)).toBeVisible();
  await page.locator('[data-point="Far away"]').getByRole('button').click();
  await expect(page.getByText(/^Out of reach by [\d,]+ mm\.$/)).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/verdicts.png' });

  await sheet.row('R1').click();
  await tab(page, 'Cycle').click();
  await expect(page.getByText(/None yet\. Add the task points that R1 goes to/)).toBeVisible();
  const add = async (name: string | RegExp) => {
    await page.getByRole('combobox', { name: 'Add a step' }).click();
    await page.getByRole('option', { name }).first().click();
  };
  await add('Pick');
  await add('Grip');
  await add('Far away');
  await add(/^Nests, place 1/);
  await add('Bead');
  const steps = page.locator('[data-step]');
  await expect(steps).toHaveCount(5);
  // What is out of reach is named, and the rest is timed.
  await expect(page.getByText(/^Step 3, Far away: Out of reach by [\d,]+ mm\. The step is left out\.$/)).toBeVisible();
  const total = page.locator('[data-cycle]');
  await expect(total).toContainText(/About [\d.]+ s a cycle/);
  const secondsOf = async () => Number(/About ([\d.]+)/.exec(await total.innerText())?.[1]);
  const before = await secondsOf();

  // A longer grip is a longer cycle, and the target is missed.
  await steps.nth(1).getByRole('button', { expanded: false }).click();
  await fill(page, 'Takes', '3');
  await expect.poll(secondsOf).toBeCloseTo(before + 2, 1);
  await fill(page, 'Target, 0 for none', '2');
  await expect(total).toContainText('over the 2.00 s wanted');
  await fill(page, 'Takes', '-1');
  await expect(page.getByText('A time is 0 s or more.')).toBeVisible();
  await page.keyboard.press('Escape');

  // The keyboard moves a step, one undo brings it back, and a step can be taken out.
  await steps.nth(0).getByRole('button', { expanded: false }).press('Alt+ArrowDown');
  await expect(steps.nth(1)).toHaveAttribute('data-step', 'Pick');
  await page.getByRole('button', { name: 'Move step 2, Pick, up' }).click();
  await expect(steps.nth(0)).toHaveAttribute('data-step', 'Pick');
  await page.getByRole('button', { name: 'Remove step 3, Far away' }).click();
  await expect(steps).toHaveCount(4);
  await expect(page.getByText(/^Step 3, Far away/)).toHaveCount(0);

  // Straight from the nest to the bead, and the chart says the same in a table.
  await steps.nth(3).getByRole('button', { expanded: false }).click();
  await page.getByRole('radio', { name: 'straight' }).click();
  await page.getByText('The chart as a table').click();
  await expect(page.getByRole('cell', { name: 'To Bead (straight move)' })).toBeVisible();
  await expect(page.getByRole('cell', { name: 'Bead (along a path)' })).toBeVisible();
  await expect(page.getByText(/An estimate from joint speeds and accelerations/)).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/cycle.png' });

  // What the tool weighs is asked before anything is said of the payload.
  await tab(page, 'Readings').click();
  await sheet.row('R1').first().click();
  const payload = page.getByRole('region', { name: 'Payload' });
  await expect(payload).toContainText('What does the tool weigh?');
  await fill(page, 'Tool mass', '14');
  await expect(payload).toContainText('2.0 kg over');
  await expect(payload).toContainText('Inertia is not checked');
  await sheet.saved();

  // A program gets the same from the API.
  const layoutId = /layouts\/([0-9a-f-]+)/.exec(page.url())?.[1] ?? '';
  const answer = await page.request.get(`/api/layouts/${layoutId}/cycle`);
  expect(answer.ok()).toBe(true);
  const { robots } = (await answer.json()) as { robots: { endS: number; steps: { label: string }[] }[] };
  expect(robots[0].steps.map(({ label }) => label)).toEqual(['Pick', 'Grip', 'Nests, place 1', 'Bead']);
  await tab(page, 'Cycle').click();
  expect(robots[0].endS).toBeCloseTo(await secondsOf(), 1);
});
