import { expect, test } from '@playwright/test';
import { ADMIN, mails, PLANNER, signIn } from './support/people';

test('a wrong password is said in words, and the right one leads on to the page that was asked for', async ({
  page,
}) => {
  await page.goto('/arms');
  await expect(page).toHaveURL(/\/sign-in/);
  await page.getByLabel('E-mail').fill(PLANNER);
  await page.getByLabel('Password', { exact: true }).fill('not the password');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert').filter({ hasText: /password/i })).toBeVisible();
});

test('an invitation comes by mail and makes an account', async ({ page, browser }) => {
  await signIn(page, ADMIN);
  await page.goto('/members');
  await page
    .getByRole('button', { name: /Invite/ })
    .first()
    .click();
  const dialog = page.getByRole('dialog');
  const address = `new-planner-${Date.now()}@brackwater.example`;
  await dialog.getByLabel('E-mail').fill(address);
  await dialog.getByRole('button', { name: /invit/i }).last().click();
  let link = '';
  await expect
    .poll(
      async () => {
        const mail = (await mails()).find(({ to }) => to.includes(address));
        link = mail?.text.match(/http\S+\/invitation\/\S+/)?.[0] ?? '';
        return link;
      },
      { timeout: 30_000 },
    )
    .not.toBe('');
  const context = await browser.newContext();
  const guest = await context.newPage();
  await guest.goto(link);
  await guest.getByLabel('Your name').or(guest.getByLabel('Name')).first().fill('Nora Newcomer');
  await guest.getByLabel('Password', { exact: true }).fill('a long enough secret');
  await guest.locator('button[type="submit"]').click();
  await expect(guest).toHaveURL(/\/(projects|sign-in)/);
  await context.close();
});

test('a forgotten password is set anew by mail, once', async ({ page }) => {
  await page.goto('/forgotten-password');
  await page.getByLabel('E-mail').fill('viewer@quillfen.example');
  await page.locator('button[type="submit"]').click();
  await expect(page.getByText(/mail/i).first()).toBeVisible();
  let link = '';
  await expect
    .poll(
      async () => {
        const mail = (await mails()).find(
          ({ to, text }) => to.includes('viewer@quillfen.example') && text.includes('/reset-password/'),
        );
        link = mail?.text.match(/http\S+\/reset-password\/\S+/)?.[0] ?? '';
        return link;
      },
      { timeout: 30_000 },
    )
    .not.toBe('');
  // Only looked at: the demo's password stays what the accounts file says.
  await page.goto(link);
  await expect(
    page
      .getByLabel('New password')
      .or(page.getByLabel('Password', { exact: true }))
      .first(),
  ).toBeVisible();
});
