import { deviceTexts } from '../../config/texts/account.js';

// In this order: many browsers carry the names of others along.
const browsers: readonly [RegExp, string][] = [
  [/\bEdg(e|A|iOS)?\//, 'Edge'],
  [/\b(OPR|Opera)\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/\b(Firefox|FxiOS)\//, 'Firefox'],
  [/\b(Chrome|Chromium|CriOS)\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];
const systems: readonly [RegExp, string][] = [
  [/\bAndroid\b/, 'Android'],
  [/\biPhone\b/, 'iPhone'],
  [/\biPad\b/, 'iPad'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b/, 'macOS'],
  [/\bCrOS\b/, 'ChromeOS'],
  [/\bLinux\b/, 'Linux'],
];
const nameIn = (names: readonly [RegExp, string][], text: string) =>
  names.find(([pattern]) => pattern.test(text))?.[1];

/** "Firefox on Linux", from what a browser calls itself: enough to tell one's own telephone from one's desk. */
export function deviceWords(userAgent: string): string {
  const browser = nameIn(browsers, userAgent);
  const system = nameIn(systems, userAgent);
  if (!browser && !system) return deviceTexts.unknown;
  return system ? deviceTexts.on(browser ?? deviceTexts.aBrowser, system) : browser!;
}
