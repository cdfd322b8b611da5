import { readFileSync } from 'node:fs';
import { isDark } from './colour-scheme.js';

describe('the colour scheme', () => {
  it('follows the system until one is chosen', () => {
    expect(isDark('system', true)).toBe(true);
    expect(isDark('system', false)).toBe(false);
    expect(isDark('light', true)).toBe(false);
    expect(isDark('dark', false)).toBe(true);
  });

  it.each([
    ['light', true],
    ['dark', false],
    [null, true],
    [null, false],
    ['purple', true],
  ])('is the same before the first paint: %s on a system that is dark: %s', (kept, systemIsDark) => {
    const script = readFileSync(new URL('../../public/colour-scheme.js', import.meta.url), 'utf8');
    let painted: boolean | undefined;
    const page = {
      localStorage: { getItem: (key: string) => (key === 'windchest.colour-scheme' ? kept : null) },
      matchMedia: () => ({ matches: systemIsDark }),
      document: {
        documentElement: { classList: { toggle: (_: string, on: boolean) => void (painted = on) } },
      },
    };
    new Function(...Object.keys(page), script)(...Object.values(page));
    expect(painted).toBe(isDark(kept === 'light' || kept === 'dark' ? kept : 'system', systemIsDark));
  });
});
