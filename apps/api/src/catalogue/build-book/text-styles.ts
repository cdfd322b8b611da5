import { inks } from './page-geometry.js';
import type { TextStyle } from './text-lines.js';

const style = (
  size: number,
  leading: number,
  face: TextStyle['face'] = 'regular',
  colour: string = inks.ink,
  tightness = 0,
): TextStyle => ({ size, leading, face, colour, spacing: -tightness * size });

export const styles = {
  kitName: style(62, 62, 'bold', inks.ink, 0.028),
  tagline: style(15, 20, 'regular', inks.soft),
  section: style(23, 27, 'bold', inks.ink, 0.018),
  stepNumber: style(23, 27, 'bold', inks.ink, 0.018),
  stepTitle: style(14, 18, 'bold', inks.ink, 0.008),
  subheading: style(11.5, 15, 'bold'),
  body: style(10, 14.2),
  lead: style(10, 14.2, 'regular', inks.soft),
  table: style(9, 12.2),
  label: style(7.5, 10, 'regular', inks.soft),
  partCode: style(7.5, 9.5, 'semibold'),
  dimension: style(7.5, 9.5, 'regular', inks.soft),
  fact: style(10.5, 13.5, 'semibold'),
  foot: style(8, 10, 'regular', inks.soft),
} as const;
