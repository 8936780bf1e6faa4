import { existsSync, readFileSync } from 'node:fs';
import { chromium, type Page } from '@playwright/test';
import { z } from 'zod';

/** Where Debian and others put the browser; CHROMIUM names another one. */
const PLACES = [
  '/usr/bin/chromium-headless-shell',
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
];

const accountsSchema = z.array(z.looseObject({ role: z.string(), email: z.string(), password: z.string() }));

/** Null where there is no browser to measure in. */
export function browserPath(): string | null {
  const places = process.env.CHROMIUM ? [process.env.CHROMIUM] : PLACES;
  return places.find((place) => existsSync(place)) ?? null;
}

/** The demo planner, from the file that `npm run up` leaves. */
function planner(): { email: string; password: string } {
  const file = process.env.DEMO_ACCOUNTS_FILE ?? '.data/demo/demo-accounts.json';
  const accounts = accountsSchema.parse(JSON.parse(readFileSync(file, 'utf8')));
  const found = accounts.find(({ role }) => role === 'planner');
  if (!found) throw new Error(`No planner in ${file}.`);
  return found;
}

/**
 * Signs in as the demo planner in headless Chromium at 1440 × 900 and opens the first sheet of the demo project. The product has to be
 * running (`npm run up`); APP_URL says where.
 */
export async function withSheet<T>(measure: (page: Page) => Promise<T>): Promise<T> {
  const executablePath = browserPath();
  if (!executablePath) throw new Error('No Chromium found; CHROMIUM may name one.');
  const app = process.env.APP_URL ?? 'http://localhost:3000';
  const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu'] });
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    page.setDefaultTimeout(60_000);
    const { email, password } = planner();
    await page.goto(`${app}/sign-in`);
    await page.getByLabel(/e-mail/i).fill(email);
    await page.getByLabel('Password', { exact: true }).fill(password);
    await page.getByRole('button', { name: /sign in/i }).click();
    await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
    await page.goto(`${app}${await firstSheet(page)}`);
    await page.locator('[data-canvas] canvas').first().waitFor();
    return await measure(page);
  } finally {
    await browser.close();
  }
}

const projectsSchema = z.looseObject({ projects: z.array(z.looseObject({ id: z.string(), name: z.string() })) });
const layoutsSchema = z.looseObject({ layouts: z.array(z.looseObject({ id: z.string(), letter: z.string() })) });

/** The project that the demo is about; any other will do where it is gone. */
const DEMO = 'Pump housing line, bay 4';

async function firstSheet(page: Page): Promise<string> {
  const read = async <T>(path: string, schema: z.ZodType<T>): Promise<T> =>
    schema.parse(await page.evaluate(async (url) => (await fetch(url)).json(), path));
  const { projects } = await read('/api/projects', projectsSchema);
  const demoFirst = [...projects].sort((one, other) => Number(other.name === DEMO) - Number(one.name === DEMO));
  for (const { id } of demoFirst) {
    const { layouts } = await read(`/api/projects/${id}/layouts`, layoutsSchema);
    if (layouts.length > 0) return `/projects/${id}/layouts/${layouts[0].id}`;
  }
  throw new Error('No sheet to open: seed the demo first.');
}
