import { inks } from '../../typesetting/page-geometry.js';
import { textStyle } from '../../typesetting/text-styles.js';

/** What only a build book has. */
export const bookStyles = {
  kitName: textStyle(62, 62, 'bold', inks.ink, 0.028),
  tagline: textStyle(15, 20, 'regular', inks.soft),
  stepNumber: textStyle(23, 27, 'bold', inks.ink, 0.018),
  stepTitle: textStyle(14, 18, 'bold', inks.ink, 0.008),
  partCode: textStyle(7.5, 9.5, 'semibold'),
  dimension: textStyle(7.5, 9.5, 'regular', inks.soft),
} as const;
