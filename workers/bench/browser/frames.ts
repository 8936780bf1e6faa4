import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import type { Page } from '@playwright/test';
import { say, title } from '../print';
import { manyItems } from './many-items';
import { browserPath, withSheet } from './sheet-page';

const ITEMS = 500;
/** Pointer moves a drag and how far apart in time: more often than frames, as a good mouse is. */
const MOVES = 120;
const EVERY_MS = 8;
const RADIUS_PX = 60;
const DRAGS = 2;

/**
 * Intervals between frames while something is dragged on a sheet of 500 items with its map shown, beside the same drag of one
 * rectangle on a bare konva stage in the same browser. The product has to be running; a variant is made for it and deleted again.
 */
export async function frames(): Promise<void> {
  title(`Frames while dragging, ${ITEMS} items and a map shown, headless Chromium, 1440 × 900`);
  if (!browserPath()) return say('Left out: no Chromium found; CHROMIUM may name one.');
  await withSheet(async (page) => {
    say(`bare stage: ${await bareStage(page)}`);
    const sheet = await manyItems(page, ITEMS);
    try {
      await page.goto(sheet.address);
      await page.locator('[data-canvas] canvas').first().waitFor();
      await page.locator('[data-map-work="none"]').waitFor({ timeout: 120_000 });
      // Pictures, fonts and the wall corners of the floor plan have come by then.
      await page.waitForTimeout(2000);
      say(`a fixture: ${await dragged(page, await placeOf(page, sheet.fixtureAtMm))}`);
      say(`a robot with its map: ${await dragged(page, await placeOf(page, sheet.robotAtMm))}`);
    } finally {
      await sheet.remove();
    }
  });
  say('Wanted: p95 ≤ 20 ms, p99 ≤ 33 ms, none over 50 ms, on two processors that have nothing else to do.');
}

interface Spot {
  readonly x: number;
  readonly y: number;
}

/** A spot of the floor, on the page. */
async function placeOf(page: Page, [xMm, yMm]: readonly [number, number]): Promise<Spot> {
  const canvas = page.locator('[data-canvas]');
  const box = await canvas.boundingBox();
  if (!box) throw new Error('The sheet is not on the screen.');
  const read: unknown = JSON.parse((await canvas.getAttribute('data-viewport')) ?? '{}');
  const { scale, xMm: leftMm, yMm: topMm } = read as { scale: number; xMm: number; yMm: number };
  return { x: box.x + (xMm - leftMm) * scale, y: box.y + (topMm - yMm) * scale };
}

async function dragged(page: Page, from: Spot): Promise<string> {
  const intervals: number[] = [];
  // The first drag warms up what the browser compiles.
  for (let turn = 0; turn <= DRAGS; turn += 1) {
    const found = await oneDrag(page, from);
    if (turn > 0) intervals.push(...found);
  }
  return printed(intervals);
}

async function oneDrag(page: Page, { x, y }: Spot): Promise<number[]> {
  await page.mouse.move(x, y);
  await page.mouse.down();
  // Picking up draws the sheet anew once; the drag is what comes after it.
  await page.mouse.move(x + 12, y, { steps: 3 });
  await page.waitForTimeout(200);
  await page.evaluate(WATCH);
  for (let move = 0; move < MOVES; move += 1) {
    const turn = (2 * Math.PI * move) / MOVES;
    await page.mouse.move(x + RADIUS_PX * Math.sin(turn), y + RADIUS_PX * (1 - Math.cos(turn)));
    await page.waitForTimeout(EVERY_MS);
  }
  const intervals = await page.evaluate<number[]>('window.endWatch()');
  await page.keyboard.press('Escape');
  await page.mouse.up();
  await page.waitForTimeout(500);
  return intervals;
}

/** Runs in the page, as text. */
const WATCH = `(() => {
  const times = [];
  let watching = true;
  const frame = (now) => { times.push(now); if (watching) requestAnimationFrame(frame); };
  requestAnimationFrame(frame);
  window.endWatch = () => { watching = false; return times.slice(1).map((time, index) => time - times[index]); };
})()`;

function printed(intervals: readonly number[]): string {
  const sorted = [...intervals].sort((one, other) => one - other);
  const at = (share: number) =>
    `${sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))].toFixed(1)} ms`;
  return `${sorted.length} frames, p50 ${at(0.5)}, p95 ${at(0.95)}, p99 ${at(0.99)}, longest ${at(1)}`;
}

async function bareStage(page: Page): Promise<string> {
  const browser = page.context().browser();
  if (!browser) throw new Error('The browser is gone.');
  const bare = await browser.newPage({ viewport: page.viewportSize() });
  await bare.setContent('<div id="stage"></div>');
  // The package names its modules only; the script for pages lies beside them.
  const konva = join(dirname(createRequire(import.meta.url).resolve('konva')), '..', 'konva.min.js');
  await bare.addScriptTag({ content: readFileSync(konva, 'utf8') });
  await bare.evaluate(`(() => {
    const stage = new Konva.Stage({ container: 'stage', width: 1100, height: 780 });
    const layer = new Konva.Layer();
    layer.add(new Konva.Rect({ x: 500, y: 300, width: 80, height: 60, stroke: 'black', draggable: true }));
    stage.add(layer);
  })()`);
  await bare.bringToFront();
  const found = await dragged(bare, { x: 548, y: 338 });
  await bare.close();
  await page.bringToFront();
  return found;
}
