/** What is taken where nobody says otherwise (common practice, no source). */
export const usual = {
  /** Between parts on a plate. */
  gapMm: 5,
  /** Along the edges of the bed. */
  marginMm: 5,
  /** The diameter of filament most printers take. */
  filamentMm: 1.75,
} as const;
