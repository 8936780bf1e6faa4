import AxeBuilder from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

/**
 * What axe finds on the page as it stands, an open dialog included: nothing, or the test names it. Open menus and tooltips are looked at by
 * themselves (`within`): they hang at the end of the document, outside of its landmarks, as the menu pattern has it.
 */
export async function expectAccessible(page: Page, what: string, within?: string): Promise<void> {
  const axe = new AxeBuilder({ page });
  const looked = within ? axe.include(within) : axe.exclude('[data-radix-popper-content-wrapper]');
  const { violations } = await looked.analyze();
  const found = violations.map(({ id, help, nodes }) => `${id}: ${help} (${nodes[0]?.target.join(' ')})`);
  expect(found, what).toEqual([]);
}
