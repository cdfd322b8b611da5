import { basketLimit, readBasket, withItem, withoutLicences } from './basket.js';

const curlew = { kitSlug: 'curlew', licenceId: 'a' };
const teal = { kitSlug: 'teal', licenceId: 'b' };

describe('the basket', () => {
  it('holds a licence once', () => {
    expect(withItem([curlew], curlew)).toEqual([curlew]);
    expect(withItem([curlew], teal)).toEqual([curlew, teal]);
  });

  it('takes no more lines than one order may have', () => {
    const full = Array.from({ length: basketLimit }, (_, at) => ({ kitSlug: 'kit', licenceId: `${at}` }));
    expect(withItem(full, teal)).toHaveLength(basketLimit);
  });

  it('lets several licences go at once', () => {
    expect(withoutLicences([curlew, teal], ['a', 'unknown'])).toEqual([teal]);
  });

  it('is empty where nothing, or something damaged, is kept', () => {
    expect(readBasket(null)).toEqual([]);
    expect(readBasket('{"kitSlug":')).toEqual([]);
    expect(readBasket('{"kitSlug":"curlew"}')).toEqual([]);
  });

  it('leaves damaged items out and keeps the rest', () => {
    expect(readBasket(JSON.stringify([curlew, null, { kitSlug: 7 }, 'x']))).toEqual([curlew]);
  });
});
