import { expect, type Locator, type Page } from '@playwright/test';

/** More stops than any page has. */
const MOST_STOPS = 150;

/** Somebody with a keyboard and nothing else: every control is reached by Tab, menus by arrows. */
export class Keys {
  constructor(private readonly page: Page) {}

  press(key: string): Promise<void> {
    return this.page.keyboard.press(key);
  }

  type(words: string): Promise<void> {
    return this.page.keyboard.type(words);
  }

  /** Tabs on until the control has the keyboard. */
  async reach(control: Locator): Promise<void> {
    await expect(control).toBeVisible({ timeout: 30_000 });
    // Looked up once: asking for it by role at every stop would take most of the story's time.
    let element = await control.elementHandle();
    for (let stop = 0; stop < MOST_STOPS; stop += 1) {
      if (await element?.evaluate((node) => node === document.activeElement)) return;
      await this.press('Tab');
      // What was drawn anew meanwhile is looked up again.
      if (!(await element?.evaluate((node) => node.isConnected))) element = await control.elementHandle();
    }
    await expect(control, 'The keyboard never gets there.').toBeFocused();
  }

  async activate(control: Locator): Promise<void> {
    await this.reach(control);
    await this.press('Enter');
  }

  /** Writes into a field in place of what is there. */
  async fill(field: Locator, words: string): Promise<void> {
    await this.reach(field);
    await this.press('Control+a');
    await this.type(words);
  }

  /** Walks an open menu down to an entry and takes it. */
  async choose(entry: Locator): Promise<void> {
    await expect(entry).toBeVisible();
    for (let stop = 0; stop < MOST_STOPS; stop += 1) {
      if (await hasKeyboard(entry)) return this.press('Enter');
      await this.press('ArrowDown');
    }
    await expect(entry, 'The arrows never get there.').toBeFocused();
  }
}

const hasKeyboard = (control: Locator): Promise<boolean> =>
  control.evaluate((element) => element === document.activeElement);
