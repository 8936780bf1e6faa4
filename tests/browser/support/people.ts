import { readFileSync } from 'node:fs';
import { expect, type Browser, type BrowserContext, type Page } from '@playwright/test';

interface DemoAccount {
  role: string;
  name: string;
  email: string;
  password: string;
  organisation: string;
}

const required = (name: string): string => {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set. Run "npm test -- browser", which starts what these stories need.`);
  return value;
};

const accounts = () => JSON.parse(readFileSync(required('DEMO_ACCOUNTS_FILE'), 'utf8')) as DemoAccount[];

export function accountOf(email: string): DemoAccount {
  const found = accounts().find((account) => account.email === email);
  if (!found) throw new Error(`The demo has no account ${email}.`);
  return found;
}

export const PLANNER = 'planner@brackwater.example';
export const INTEGRATOR = 'integrator@brackwater.example';
export const ADMIN = 'admin@brackwater.example';
export const VIEWER = 'viewer@quillfen.example';
export const STRANGER = 'planner@osterlode.example';

export async function signIn(page: Page, email: string): Promise<void> {
  const { password } = accountOf(email);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).toHaveURL(/\/projects/);
}

/** A person at a browser of their own. */
export async function personAt(browser: Browser, email: string): Promise<{ context: BrowserContext; page: Page }> {
  const context = await browser.newContext();
  const page = await context.newPage();
  await signIn(page, email);
  return { context, page };
}

interface KeptMail {
  to: string;
  subject: string;
  text: string;
}

/** The mails that the stand-in has kept, newest first. */
export async function mails(): Promise<KeptMail[]> {
  const answer = await fetch(`${required('MAILBOX_URL')}/mails`);
  return (await answer.json()) as KeptMail[];
}
