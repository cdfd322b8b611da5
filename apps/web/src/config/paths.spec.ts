import { comeBackTo, paths, signInThenBack } from './paths.js';

describe('paths', () => {
  it('build links with their names filled in and written safely', () => {
    expect(paths.kit.to({ slug: 'curlew' })).toBe('/kits/curlew');
    expect(paths.kit.to({ slug: 'a b/c' })).toBe('/kits/a%20b%2Fc');
    expect(paths.workshop.gates.to({ kitId: 'k', revisionId: 'r' })).toBe(
      '/workshop/kits/k/revisions/r/gates',
    );
  });

  it('carry a query, without what is not said', () => {
    expect(paths.order.to({ orderId: 'o' }, { key: 'k', page: undefined })).toBe('/orders/o?key=k');
    expect(paths.home.to()).toBe('/');
  });

  it('lead nowhere twice', () => {
    const flat = [paths, paths.workshop]
      .flatMap((group) => Object.values(group))
      .filter((one) => 'path' in one);
    const all = flat.map((one) => (one as { path: string }).path);
    expect(new Set(all).size).toBe(all.length);
  });
});

describe('coming back after signing in', () => {
  it('goes where one was', () => {
    const link = signInThenBack('/workshop/orders?page=2');
    expect(comeBackTo(new URLSearchParams(link.split('?')[1]).get('from'))).toBe('/workshop/orders?page=2');
  });

  it.each([
    null,
    '',
    'https://elsewhere.example',
    '//elsewhere.example',
    '/\\elsewhere.example',
    'javascript:alert(1)',
  ])('goes to the shelf, not to %p', (from) => {
    expect(comeBackTo(from)).toBe('/shelf');
  });
});
