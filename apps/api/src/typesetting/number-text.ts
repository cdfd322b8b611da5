/** Numbers as they are set: a true minus, no more digits than they need. */
export const numberText = (value: number, decimals: number): string =>
  String(Number(value.toFixed(decimals))).replace('-', '−');

/** With all its decimals, so that columns line up. */
export const fixedText = (value: number, decimals: number): string => {
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? text.replace('-', '') : text.replace('-', '−');
};

/** `+0.3`, `−12.0`, `0.0` */
export const signedText = (value: number, decimals: number): string => {
  const text = fixedText(value, decimals);
  return Number(value.toFixed(decimals)) > 0 ? `+${text}` : text;
};

const dayFormat = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
});

/** `12 November 2026`: the months written out, for their short forms differ between editions of ICU. */
export const dayText = (moment: Date): string => dayFormat.format(moment);

export const boxText = (x: number, y: number, z: number, decimals = 1): string =>
  [x, y, z].map((value) => numberText(value, decimals)).join(' × ');
