import { locate } from './location-evidence.js';

// Published rule: Implementing Regulation (EU) 282/2011, art. 24b (d): two non-contradictory items.
describe('where a buyer is', () => {
  it('is the country that the declaration and another piece agree on', () => {
    expect(locate('DE', 'DE', 'FR')).toEqual({ country: 'DE', isClear: true });
    expect(locate('DE', null, 'DE')).toEqual({ country: 'DE', isClear: true });
  });

  it('is what billing address and card agree on, against the declaration', () => {
    expect(locate('DE', 'FR', 'FR')).toEqual({ country: 'FR', isClear: true });
  });

  it('stays as declared, and unclear, where no two agree', () => {
    expect(locate('DE', 'FR', 'AT')).toEqual({ country: 'DE', isClear: false });
    expect(locate('DE', null, null)).toEqual({ country: 'DE', isClear: false });
    expect(locate('DE', 'FR', null)).toEqual({ country: 'DE', isClear: false });
  });
});
