/** DECIMAL comes as `25.500`; people write `25.5`. */
export const rateText = (rate: string | number): string =>
  String(rate)
    .replace(/(\.\d*?)0+$/, '$1')
    .replace(/\.$/, '');
