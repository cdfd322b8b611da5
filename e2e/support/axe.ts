import { AxeBuilder } from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Contrast hangs on the scheme alone and the layout on the width, so each is looked at once. */
const LOOKS = [
  { colorScheme: 'light', width: 360 },
  { colorScheme: 'dark', width: 1280 },
] as const;
/** The narrowest window that everything must fit (WCAG 2.2, 1.4.10 Reflow). */
const NARROWEST_PX = 320;

/** No violation on the page as it stands, in light and dark, wide and narrow; nothing wider than its window. */
export const expectAccessible = async (page: Page, name: string): Promise<void> => {
  const size = page.viewportSize();
  for (const { colorScheme, width } of LOOKS) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.setViewportSize({ width, height: 900 });
    // Colours move for a moment after a change of scheme; axe must not read them half way.
    await page.waitForTimeout(250);
    const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
    const found = violations.map(
      (one) => `${one.id}: ${one.nodes.map((node) => node.target.join(' ')).join(', ')}`,
    );
    expect([name, colorScheme, width, ...found]).toEqual([name, colorScheme, width]);
    await expectToFit(page, name, width);
  }
  await page.setViewportSize({ width: NARROWEST_PX, height: 900 });
  await expectToFit(page, name, NARROWEST_PX);
  await page.emulateMedia({ colorScheme: 'light' });
  if (size) await page.setViewportSize(size);
};

/** Drawings take their new width a moment after the window. */
const expectToFit = (page: Page, name: string, width: number): Promise<void> =>
  expect
    .poll(
      () => page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth),
      { message: `${name} is wider than its window of ${width} px by`, timeout: 5000 },
    )
    .toBe(0);
