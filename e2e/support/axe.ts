import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** No violation on the page as it stands, in light and dark, wide and narrow. */
export const expectAccessible = async (page: Page, name: string): Promise<void> => {
  const size = page.viewportSize();
  for (const colorScheme of ['light', 'dark'] as const)
    for (const width of [1280, 360]) {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.setViewportSize({ width, height: 900 });
      // Colours move for a moment after a change of scheme; axe must not read them half way.
      await page.waitForTimeout(250);
      const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
      const found = violations.map(
        (one) => `${one.id}: ${one.nodes.map((node) => node.target.join(' ')).join(', ')}`,
      );
      expect([name, colorScheme, width, ...found]).toEqual([name, colorScheme, width]);
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect([name, width, 'is wider than its window by', overflow]).toEqual([
        name,
        width,
        'is wider than its window by',
        0,
      ]);
    }
  await page.emulateMedia({ colorScheme: 'light' });
  if (size) await page.setViewportSize(size);
};
