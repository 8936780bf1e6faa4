import { expect, type Locator, type Page } from '@playwright/test';

interface Viewport {
  scale: number;
  xMm: number;
  yMm: number;
}

/** The middle of the board, and where a floor point is on the screen. */
export class Sheet {
  constructor(private readonly page: Page) {}

  get canvas(): Locator {
    return this.page.locator('[data-canvas]');
  }

  async at(xMm: number, yMm: number): Promise<{ x: number; y: number }> {
    const box = await this.canvas.boundingBox();
    const viewport = JSON.parse((await this.canvas.getAttribute('data-viewport')) ?? '{}') as Viewport;
    if (!box) throw new Error('The sheet is not on the screen.');
    return { x: box.x + (xMm - viewport.xMm) * viewport.scale, y: box.y + (viewport.yMm - yMm) * viewport.scale };
  }

  /** Whether a floor point is on the board as it is shown now. */
  async shows(xMm: number, yMm: number): Promise<boolean> {
    const box = await this.canvas.boundingBox();
    const { x, y } = await this.at(xMm, yMm);
    return box !== null && x > box.x && x < box.x + box.width && y > box.y && y < box.y + box.height;
  }

  /** Zooms in on a floor point until a picture pixel covers about a screen pixel; answers how many it covers. */
  async zoomTo(xMm: number, yMm: number, mmPerPx: number): Promise<number> {
    const zoom = async () =>
      (JSON.parse((await this.canvas.getAttribute('data-viewport')) ?? '{}') as Viewport).scale * mmPerPx;
    for (let turn = 0; turn < 20 && (await zoom()) < 1; turn++) {
      const before = await zoom();
      const { x, y } = await this.at(xMm, yMm);
      await this.page.mouse.move(x, y);
      await this.page.mouse.wheel(0, -150);
      await expect.poll(zoom).not.toBe(before);
    }
    // The sharper size of the picture comes after the zoom.
    await this.page.waitForLoadState('networkidle');
    return zoom();
  }

  async click(xMm: number, yMm: number): Promise<void> {
    const { x, y } = await this.at(xMm, yMm);
    await this.page.mouse.click(x, y);
  }

  async drag(from: [number, number], to: [number, number]): Promise<void> {
    const start = await this.at(...from);
    const end = await this.at(...to);
    await this.page.mouse.move(start.x, start.y);
    await this.page.mouse.down();
    await this.page.mouse.move((start.x + end.x) / 2, (start.y + end.y) / 2, { steps: 6 });
    await this.page.mouse.move(end.x, end.y, { steps: 6 });
    await this.page.mouse.up();
  }

  async placeRobot(arm: string, xMm: number, yMm: number): Promise<void> {
    await this.page.locator('button[data-tool="robot"]').click();
    await this.page.getByRole('menuitem', { name: arm }).click();
    await this.click(xMm, yMm);
    await this.type({ x: xMm, y: yMm });
  }

  async placeFixture(xMm: number, yMm: number): Promise<void> {
    await this.page.locator('button[data-tool="fixture"]').click();
    await this.click(xMm, yMm);
    await this.type({ x: xMm, y: yMm });
  }

  /** Typed values of what is chosen. */
  async type(values: Partial<Record<'x' | 'y' | 'Angle', number>>): Promise<void> {
    for (const [label, value] of Object.entries(values)) {
      const field = this.values.getByLabel(label, { exact: true }).first();
      await field.fill(String(value));
      await field.press('Enter');
    }
  }

  get values(): Locator {
    return this.page.getByRole('complementary', { name: 'Values and readings' });
  }

  row(name: string | RegExp): Locator {
    return this.page.locator('[data-item-row]').filter({ hasText: name });
  }

  async saved(): Promise<void> {
    await expect(this.page.getByText(/saved/i).first()).toBeVisible();
  }

  /** All maps drawn and none under way. */
  async mapsDone(): Promise<void> {
    await expect(this.page.locator('[data-map-work="none"]')).toBeVisible({ timeout: 60_000 });
    await expect(this.page.getByText(/of reached floor at or above the line|of floor reached/)).toBeVisible();
  }
}
