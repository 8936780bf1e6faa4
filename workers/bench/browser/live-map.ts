import type { Page } from '@playwright/test';
import { say, table, title } from '../print';
import { browserPath, withSheet } from './sheet-page';

/** Pointer moves a drag, and how far apart in time: a mouse reports about as often as a screen is drawn. */
const MOVES = 100;
const EVERY_MS = 16;
const DRAGS = 3;

interface Watched {
  /** ms from each pointer move that changed the height to the first picture that shows it or a newer one. */
  readonly latencies: number[];
  readonly pictures: number;
}

/**
 * From pointer move to repainted map: the tool height is dragged along its line with the first demo sheet open (six-axis arms, tool down),
 * and each move is timed until the first picture whose map is of that height or of a newer one.
 */
export async function liveMap(): Promise<void> {
  title('Live map: pointer move to repainted map, headless Chromium, 1440 × 900');
  if (!browserPath()) return say('Left out: no Chromium found; CHROMIUM may name one.');
  const drags = await withSheet(async (page) => {
    await page.locator('[data-map-height]').waitFor();
    await page.getByRole('button', { name: 'Change', exact: true }).click();
    const drag = () => dragHeight(page);
    // The first one warms up what the browser compiles.
    await drag();
    const found: Watched[] = [];
    for (let turn = 0; turn < DRAGS; turn++) found.push(await drag());
    return found;
  });
  const all = drags.flatMap(({ latencies }) => latencies).sort((one, other) => one - other);
  const at = (share: number) => `${all[Math.min(all.length - 1, Math.floor(share * all.length))].toFixed(1)} ms`;
  table(
    ['moves timed', 'pictures', 'median', 'p95', 'p99', 'longest'],
    [
      [
        String(all.length),
        String(drags.reduce((sum, { pictures }) => sum + pictures, 0)),
        at(0.5),
        at(0.95),
        at(0.99),
        at(1),
      ],
    ],
  );
}

async function dragHeight(page: Page): Promise<Watched> {
  const thumb = page.getByRole('slider', { name: 'Tool height over floor, dragged' });
  const line = await thumb.evaluate((element) => {
    const box = element.closest('[data-orientation]')!.parentElement!.getBoundingClientRect();
    const own = element.getBoundingClientRect();
    return { left: box.left, width: box.width, x: own.x + own.width / 2, y: own.y + own.height / 2 };
  });
  await page.evaluate(WATCH);
  await page.mouse.move(line.x, line.y);
  await page.mouse.down();
  for (let move = 0; move < MOVES; move++) {
    // To and fro between a fifth and four fifths of the line.
    const share = 0.5 + 0.3 * Math.sin((2 * Math.PI * move) / MOVES);
    await page.mouse.move(line.left + share * line.width, line.y);
    await page.waitForTimeout(EVERY_MS);
  }
  await page.waitForTimeout(400);
  await page.mouse.up();
  const watched = await page.evaluate<Watched>('window.endWatch()');
  // The stored map takes over before the next drag.
  await page.waitForTimeout(1500);
  return watched;
}

/** Runs in the page, as text: what it calls is the page's own. */
const WATCH = `(() => {
  const sheet = document.querySelector('[data-canvas]');
  const thumb = document.querySelector('[role=slider][aria-label="Tool height over floor, dragged"]');
  const waiting = [];
  const latencies = [];
  let pictures = 0;
  let last = thumb.getAttribute('aria-valuenow');
  let moved = 0;
  const onMove = (event) => { moved = event.timeStamp; };
  window.addEventListener('pointermove', onMove, true);
  const wishes = new MutationObserver(() => {
    const height = thumb.getAttribute('aria-valuenow');
    if (height === last) return;
    last = height;
    waiting.push({ height: Number(height), at: moved });
  });
  wishes.observe(thumb, { attributes: true, attributeFilter: ['aria-valuenow'] });
  const maps = new MutationObserver(() => {
    const height = Number(sheet.getAttribute('data-map-height'));
    // The canvas is drawn in the next frame; a message after it comes once that frame has been handed over.
    requestAnimationFrame(() => {
      const { port1, port2 } = new MessageChannel();
      port1.onmessage = () => {
        const now = performance.now();
        const index = waiting.findLastIndex((wish) => Math.abs(wish.height - height) < 0.5);
        if (index < 0) return;
        pictures += 1;
        for (const { at } of waiting.splice(0, index + 1)) latencies.push(now - at);
      };
      port2.postMessage(null);
    });
  });
  maps.observe(sheet, { attributes: true, attributeFilter: ['data-map-height'] });
  window.endWatch = () => {
    window.removeEventListener('pointermove', onMove, true);
    wishes.disconnect();
    maps.disconnect();
    return { latencies, pictures };
  };
})()`;
