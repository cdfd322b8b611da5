import { apiAddress, fillPath, queryText } from './api-address.js';

describe('addresses of the API', () => {
  it('refuse to be made without a value they need', () => {
    expect(() => fillPath('/kits/:slug', {})).toThrow('/kits/:slug needs a value for slug.');
    expect(() => fillPath('/kits/:slug', { slug: '' })).toThrow('slug');
  });

  it('leave out what is not said', () => {
    expect(queryText({ page: 1, search: '', state: undefined, coupon: null })).toBe('?page=1');
    expect(queryText(undefined)).toBe('');
  });

  it('serve links to files', () => {
    expect(apiAddress('GET /workshop/orders.csv', { query: { state: 'paid' } })).toBe(
      '/api/workshop/orders.csv?state=paid',
    );
  });
});
