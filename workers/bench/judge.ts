import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import { build } from 'vite';
import { browserPath } from './browser/sheet-page';
import { judgeTimes } from './judge-workload';
import { say, table, title } from './print';

const WARM_UP = 20;
const MOVES = 120;
const CASES = ['robot', 'fixture', 'from scratch'] as const;

/** How long a cell of 4 robots and 60 task points takes to be judged again after one thing was dragged a little. */
export async function judge(): Promise<void> {
  title('Judging 4 robots at 60 task points again after a move, ms');
  const rows = CASES.map((each) => ['Node', each, ...percentiles(judgeTimes(each, WARM_UP + MOVES))]);
  const path = browserPath();
  if (path) rows.push(...(await inBrowser(path)));
  table(['where', 'dragged', 'median', 'p95', 'most'], rows);
  if (!path) say('The browser is left out: no Chromium found; CHROMIUM may name one.');
  say('Wanted in the browser: p95 ≤ 100 ms.');
}

function percentiles(times: readonly number[]): string[] {
  const sorted = times.slice(WARM_UP).sort((a, b) => a - b);
  const at = (share: number): string =>
    sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))].toFixed(1);
  return [at(0.5), at(0.95), at(1)];
}

/** The same code, bundled, in a page of headless Chromium. */
async function inBrowser(executablePath: string): Promise<string[][]> {
  const code = await bundled();
  const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu'] });
  try {
    const page = await browser.newPage();
    await page.addScriptTag({ content: code });
    const rows: string[][] = [];
    for (const each of CASES) {
      const times = await page.evaluate(
        ([dragged, moves]) => (globalThis as unknown as { judgeTimes: typeof judgeTimes }).judgeTimes(dragged, moves),
        [each, WARM_UP + MOVES] as const,
      );
      rows.push(['Chromium', each, ...percentiles(times)]);
    }
    return rows;
  } finally {
    await browser.close();
  }
}

async function bundled(): Promise<string> {
  const root = fileURLToPath(new URL('../..', import.meta.url));
  const result = await build({
    root,
    configFile: false,
    logLevel: 'error',
    publicDir: false,
    resolve: { alias: { '@': root.replace(/\/$/, '') } },
    build: {
      write: false,
      lib: {
        entry: fileURLToPath(new URL('./browser/judge-entry.ts', import.meta.url)),
        formats: ['iife'],
        name: 'bench',
      },
    },
  });
  const outputs = (Array.isArray(result) ? result : [result]).flatMap((each) => ('output' in each ? each.output : []));
  const chunk = outputs.find((output) => output.type === 'chunk');
  if (!chunk) throw new Error('Nothing was bundled.');
  return chunk.code;
}
