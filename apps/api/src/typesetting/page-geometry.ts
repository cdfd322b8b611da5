/** A point is 1/72 inch (ISO 32000-1, 8.3.2.3), an inch 25.4 mm. */
export const pointsPerMm = 72 / 25.4;
export const mm = (value: number): number => value * pointsPerMm;

/** A4 (ISO 216), in points. Step numbers and dimension lines hang in the left edge, text starts right of it. */
export const page = {
  width: mm(210),
  height: mm(297),
  edge: mm(20),
  left: mm(42),
  right: mm(192),
  top: mm(22),
  bottom: mm(297 - 25),
  foot: mm(297 - 15),
} as const;

export const contentWidth = page.right - page.left;
/** A measure of about sixty characters, and beside it a column for drawings. */
export const textWidth = mm(101);
export const sideLeft = page.left + mm(107);
export const sideWidth = page.right - sideLeft;

/** The shop's neutrals as sRGB, as its mails have them; paper is white. */
export const inks = {
  ink: '#172232',
  soft: '#505c6c',
  hairline: '#b9c2ca',
  faint: '#dfe4e8',
} as const;
