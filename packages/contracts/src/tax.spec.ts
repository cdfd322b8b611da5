import { readVatNumber, unionCountries } from './tax.js';

describe('a VAT number', () => {
  // Forms of the table "VAT identification number structure" (VIES questions and answers), digits made up.
  it.each([
    ['AT', 'ATU99999999'],
    ['BE', 'BE0999999999'],
    ['BG', 'BG999999999'],
    ['BG', 'BG9999999999'],
    ['CY', 'CY99999999L'],
    ['CZ', 'CZ99999999'],
    ['CZ', 'CZ999999999'],
    ['CZ', 'CZ9999999999'],
    ['DE', 'DE999999999'],
    ['DK', 'DK99999999'],
    ['EE', 'EE999999999'],
    ['ES', 'ESX9999999X'],
    ['ES', 'ESX99999999'],
    ['FI', 'FI99999999'],
    ['FR', 'FRXX999999999'],
    ['GR', 'EL999999999'],
    ['HR', 'HR99999999999'],
    ['HU', 'HU99999999'],
    ['IE', 'IE9S99999L'],
    ['IE', 'IE9+99999L'],
    ['IE', 'IE9999999WI'],
    ['IT', 'IT99999999999'],
    ['LT', 'LT999999999'],
    ['LT', 'LT999999999999'],
    ['LU', 'LU99999999'],
    ['LV', 'LV99999999999'],
    ['MT', 'MT99999999'],
    ['NL', 'NL999999999B99'],
    ['PL', 'PL9999999999'],
    ['PT', 'PT999999999'],
    ['RO', 'RO99'],
    ['RO', 'RO9999999999'],
    ['SE', 'SE999999999999'],
    ['SI', 'SI99999999'],
    ['SK', 'SK9999999999'],
  ])('of %s may be %s', (country, number) => {
    expect(readVatNumber(number, country)).toEqual({ number });
    // Longer than any.
    expect(readVatNumber(`${number}123456789`, country)).toHaveProperty('fault');
  });

  it('is read as people write it', () => {
    for (const text of ['DE 123 456 789', 'de123456789', '123456789', ' DE-123.456.789 '])
      expect(readVatNumber(text, 'DE')).toEqual({ number: 'DE123456789' });
    expect(readVatNumber('123456789', 'GR')).toEqual({ number: 'EL123456789' });
  });

  it.each([
    ['DE', 'DE12345678', 'such as DE123456789'],
    ['DE', 'FR12123456789', 'begins with FR'],
    ['AT', 'AT123456789', 'such as ATU12345678'],
    ['ES', 'ES123456789', 'such as'],
    ['NL', 'NL123456789A01', 'such as'],
    ['GR', 'GR123456789', 'such as EL123456789'],
    // With FR before it, it could be a French one; without, it is taken for what it says.
    ['FR', 'DE123456789', 'begins with DE'],
    ['DE', '', 'such as'],
  ])('of %s is not %p', (country, text, why) => {
    expect(readVatNumber(text, country)).toEqual({ fault: expect.stringMatching(why) as string });
  });

  it('has a form for each country of the Union and for no other', () => {
    expect(new Set(unionCountries).size).toBe(27);
    for (const country of unionCountries)
      expect(readVatNumber('?', country)).toEqual({ fault: expect.stringContaining('such as') as string });
    expect(readVatNumber('GB999999973', 'GB')).toEqual({
      fault: expect.stringContaining('European Union alone') as string,
    });
  });
});
