import { inks } from './page-geometry.js';
import type { TextStyle } from './text-lines.js';

/** @param tightness share of the size by which letters stand closer; large type is set tighter */
export const textStyle = (
  size: number,
  leading: number,
  face: TextStyle['face'] = 'regular',
  colour: string = inks.ink,
  tightness = 0,
): TextStyle => ({ size, leading, face, colour, spacing: -tightness * size });

/** What every document of the workshop is set in. */
export const styles = {
  section: textStyle(23, 27, 'bold', inks.ink, 0.018),
  subheading: textStyle(11.5, 15, 'bold'),
  body: textStyle(10, 14.2),
  lead: textStyle(10, 14.2, 'regular', inks.soft),
  table: textStyle(9, 12.2),
  label: textStyle(7.5, 10, 'regular', inks.soft),
  fact: textStyle(10.5, 13.5, 'semibold'),
  foot: textStyle(8, 10, 'regular', inks.soft),
} as const;
