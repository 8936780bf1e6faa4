import { readFileSync } from 'node:fs';
import { expect, test, type Page } from '@playwright/test';
import { INTEGRATOR, signIn } from './support/people';
import { DEMO_PROJECT, openVariant } from './support/projects';
import { Sheet } from './support/sheet';

const WORRY = 'The door of the deburr stand hits the guard.';
const GUEST = { name: 'Vera Quill', email: 'vera@quillfen.example' };
const PATIENCE = { timeout: 60_000 };

/** Issues the open sheet and answers the revision's page. */
async function issue(page: Page, note: string): Promise<string> {
  await page.getByRole('button', { name: 'Issue for review' }).click();
  await page.getByLabel('Note to the reviewer').fill(note);
  await page.getByRole('button', { name: /^Issue revision/ }).click();
  await expect(page).toHaveURL(/\/revisions\//, PATIENCE);
  return page.url();
}

/** A link from the revision's page that may sign. */
async function shareForSigning(page: Page): Promise<string> {
  await page.getByRole('button', { name: 'Share' }).click();
  await page.getByText('May accept it or ask for changes').click();
  await page.getByRole('button', { name: 'Make a link' }).click();
  const address = await page.getByLabel('Address').inputValue();
  await page.keyboard.press('Escape');
  return address;
}

test('issue, ask for changes on a phone, compare, issue again, accept, download', async ({ page, browser }) => {
  test.setTimeout(170_000);
  await page.setViewportSize({ width: 1440, height: 900 });
  await signIn(page, INTEGRATOR);
  await openVariant(page, DEMO_PROJECT, /R2 turned in/);
  const sheetUrl = page.url();
  const sheet = new Sheet(page);
  await sheet.saved();
  const first = await issue(page, 'R2 is turned in.');
  const firstLink = await shareForSigning(page);

  // The customer has a phone and no account.
  const phone = await browser.newContext({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });
  const customer = await phone.newPage();
  const opened = await customer.goto(firstLink);
  expect(opened?.headers()['referrer-policy']).toBe('no-referrer');
  expect(opened?.headers()['cache-control']).toContain('no-store');
  expect(opened?.headers()['x-robots-tag']).toContain('noindex');
  await expect(customer.getByRole('button', { name: 'Accept revision' })).toBeVisible(PATIENCE);
  await customer.screenshot({ path: 'test-results/pictures/sign-off-390.png' });
  await customer.getByRole('combobox', { name: 'Remark on a thing' }).click();
  await customer.getByRole('option').first().click();
  await customer.getByLabel('Your remark').fill(WORRY);
  await customer.getByLabel('Your name').fill(GUEST.name);
  await customer.getByLabel('Your e-mail address').fill(GUEST.email);
  await customer.getByRole('button', { name: 'Pin the remark' }).click();
  await expect(customer.getByText(WORRY).first()).toBeVisible();
  await customer.getByRole('button', { name: 'Ask for changes' }).click();
  await customer.getByLabel('What has to change').fill('Give the door room.');
  await customer.getByRole('button', { name: 'Send', exact: true }).click();
  await expect(customer.getByRole('dialog')).toBeHidden();
  await expect(customer.getByText('Changes asked for').first()).toBeVisible();

  // The integrator sees it, looks at what the draft changes, and issues again.
  await page.goto(first);
  await expect(page.getByText('Changes asked for').first()).toBeVisible(PATIENCE);
  await expect(page.getByText(GUEST.name).first()).toBeVisible();
  await page.getByRole('button', { name: 'Open', exact: true }).click();
  await page.getByRole('menuitem', { name: 'What changed since' }).click();
  await expect(page.getByRole('heading', { name: 'What changes', exact: true })).toBeVisible(PATIENCE);
  await expect(page.getByText(WORRY)).toBeVisible();
  await page.screenshot({ path: 'test-results/pictures/compare-1440.png' });
  await page.goto(sheetUrl);
  await sheet.saved();
  const second = await issue(page, 'The door has room now.');
  // Open remarks are carried forward to the new revision.
  await expect(page.getByText(WORRY)).toBeVisible();
  const secondLink = await shareForSigning(page);
  await customer.reload();
  await expect(customer.getByText(/has been issued since/)).toBeVisible(PATIENCE);
  await expect(customer.getByRole('button', { name: 'Accept revision' })).toHaveCount(0);

  await customer.goto(secondLink);
  await customer.getByRole('button', { name: 'Accept revision' }).click(PATIENCE);
  await customer.getByRole('button', { name: 'Sign and accept' }).click();
  await expect(customer.getByRole('button', { name: 'Accepted', exact: true })).toBeDisabled();
  await phone.close();

  // What was accepted is handed over on paper.
  await page.goto(`${second}/hand-over`);
  await page.getByRole('button', { name: 'Make the PDF' }).click(PATIENCE);
  const button = page.getByRole('button', { name: /^Download .*\.pdf/ }).first();
  await expect(button).toBeVisible({ timeout: 90_000 });
  const [download] = await Promise.all([page.waitForEvent('download'), button.click()]);
  expect(
    readFileSync(await download.path())
      .subarray(0, 5)
      .toString(),
  ).toBe('%PDF-');
});
