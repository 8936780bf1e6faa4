import { expect, test } from '@playwright/test';
import { INTEGRATOR, mails, personAt, PLANNER, signIn } from './support/people';
import { DEMO_PROJECT, openVariant } from './support/projects';
import { Sheet } from './support/sheet';

const WORRY = 'Our maintenance cart needs 900 mm behind the deburr stand.';
const ANSWER = 'We turn the stand by a quarter; then there are 1,050 mm.';

test('issue, share, remark on a phone, answer, settle', async ({ page, browser }) => {
  // The integrator issues the sheet and makes a link.
  await signIn(page, INTEGRATOR);
  await openVariant(page, DEMO_PROJECT, /robots face to face/);
  const sheet = new Sheet(page);
  const sheetUrl = page.url();
  await sheet.mapsDone();
  await sheet.saved();
  await page.getByRole('button', { name: 'Issue for review' }).click();
  await page.getByLabel('Note to the reviewer').fill('Both robots face each other now.');
  await page.getByRole('button', { name: /^Issue revision/ }).click();
  await expect(page).toHaveURL(/\/revisions\//);
  await page.screenshot({ path: 'test-results/pictures/revision-1440.png' });
  await page.goto(sheetUrl);
  await page.getByRole('button', { name: 'Share' }).click();
  await page.getByLabel('For whom').fill('Quillfen, plant manager');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const address = await page.getByLabel('Address').inputValue();
  expect(address).toMatch(/\/share\/[\w-]{43}$/);

  // The customer has no account, only a phone.
  const phone = await browser.newContext({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });
  const customer = await phone.newPage();
  const opened = await customer.goto(address);
  expect(opened?.headers()['referrer-policy']).toBe('no-referrer');
  expect(opened?.headers()['cache-control']).toContain('no-store');
  await expect(customer.getByText(/robots face to face/).first()).toBeVisible();
  await expect(customer.getByText(/Bare paper/)).toBeVisible();
  await expect(customer.getByText(/risk assessment/).first()).toBeVisible();
  await customer.waitForLoadState('networkidle');
  await customer.screenshot({ path: 'test-results/pictures/share-390.png' });
  const canvas = customer.locator('canvas').last();
  const box = await canvas.boundingBox();
  if (!box) throw new Error('The drawing is not on the screen.');
  await customer.touchscreen.tap(box.x + box.width * 0.32, box.y + box.height * 0.72);
  await customer
    .getByLabel(/remark/i)
    .first()
    .fill(WORRY);
  await customer.getByLabel('Your name').fill('Vera Quill');
  await customer.getByLabel('Your e-mail address').fill('vera@quillfen.example');
  await customer
    .getByRole('button', { name: /remark/i })
    .last()
    .click();
  await expect(customer.getByText(WORRY)).toBeVisible();
  await expect(customer.getByText(/^You,/).first()).toBeVisible();

  // The integrator side gets a mail; the planner sees the remark on the sheet, answers and settles it.
  await expect
    .poll(async () => (await mails()).filter(({ text }) => text.includes('maintenance cart')).length, {
      timeout: 30_000,
    })
    .toBeGreaterThan(0);
  const planner = await personAt(browser, PLANNER);
  await planner.page.goto(sheetUrl);
  await planner.page.getByRole('tab', { name: /^Remarks/ }).click();
  await planner.page.getByRole('button', { name: new RegExp(WORRY.slice(0, 20)) }).click();
  await planner.page.getByLabel(/Answer to remark/).fill(ANSWER);
  await planner.page.getByRole('button', { name: 'Send answer' }).click();
  await expect(planner.page.getByText(ANSWER)).toBeVisible();
  await planner.page.getByRole('button', { name: 'Settle' }).click();
  await planner.context.close();

  // The customer reads the answer, and has a mail of it.
  await customer.reload();
  await customer.getByText(WORRY).click();
  await expect(customer.getByText(ANSWER)).toBeVisible();
  await expect
    .poll(
      async () =>
        (await mails()).some(({ to, text }) => to.includes('vera@quillfen.example') && text.includes('quarter')),
      {
        timeout: 30_000,
      },
    )
    .toBe(true);
  await phone.close();
});

test('a revoked or invented link opens nothing and says whom to ask', async ({ page }) => {
  await page.goto(`/share/${'A'.repeat(43)}`);
  await expect(page.getByText(/ask/i).first()).toBeVisible();
  await expect(page.locator('canvas')).toHaveCount(0);
});
