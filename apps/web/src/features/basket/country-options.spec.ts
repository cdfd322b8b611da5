import { countryCodes } from './country-codes.js';
import { countryOptions } from './country-options.js';

describe('the countries to choose from', () => {
  // ISO 3166-1 has 249 officially assigned alpha-2 codes (from memory).
  it('are those of ISO 3166-1, each once', () => {
    expect(countryCodes).toHaveLength(249);
    expect(new Set(countryCodes).size).toBe(249);
    expect(countryCodes.every((code) => /^[A-Z]{2}$/.test(code))).toBe(true);
  });

  it('stand by name, the likely ones before them', () => {
    const options = countryOptions('en-GB', { languages: ['de-AT', 'en'], workshopCountry: 'IE' });
    expect(options.slice(0, 3).map((one) => one.label)).toEqual(['Austria', 'Ireland', 'Afghanistan']);
    expect(options).toHaveLength(249);
    expect(options.filter((one) => one.value === 'IE')).toHaveLength(1);
  });

  it('bears languages that name no country, or nothing', () => {
    const options = countryOptions('en-GB', { languages: ['en', 'not a tag'], workshopCountry: undefined });
    expect(options[0]?.label).toBe('Afghanistan');
  });
});
