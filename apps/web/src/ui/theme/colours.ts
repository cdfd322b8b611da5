import type { Oklch } from './kit-palette.js';

export const neutralNames = [
  'ground',
  'sheet',
  'ink',
  'inkSoft',
  'hairline',
  'edge',
  'ok',
  'warn',
  'stop',
] as const;
type Neutral = (typeof neutralNames)[number];

/**
 * The drawing office by day and by night. `edge` is the outline of what can be filled in or pressed: a
 * hairline is too faint for it (WCAG 2.2, 1.4.11 asks 3:1).
 */
export const schemes: Record<'light' | 'dark', Record<Neutral, Oklch>> = {
  light: {
    ground: [0.968, 0.006, 235],
    sheet: [0.993, 0.002, 235],
    ink: [0.25, 0.035, 258],
    inkSoft: [0.465, 0.03, 255],
    hairline: [0.86, 0.012, 245],
    edge: [0.58, 0.025, 250],
    ok: [0.46, 0.1, 160],
    warn: [0.52, 0.11, 70],
    stop: [0.48, 0.17, 27],
  },
  dark: {
    ground: [0.215, 0.042, 259],
    sheet: [0.25, 0.05, 258],
    ink: [0.945, 0.014, 235],
    inkSoft: [0.78, 0.03, 240],
    hairline: [0.385, 0.045, 252],
    edge: [0.63, 0.045, 248],
    ok: [0.82, 0.12, 160],
    warn: [0.84, 0.11, 80],
    stop: [0.78, 0.11, 25],
  },
};
