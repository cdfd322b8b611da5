import type { Session } from '@windchest/contracts';
import { landing } from './enter.js';

const buyer: Session = {
  person: null,
  permissions: [],
  workshop: { name: 'Workshop', currency: 'EUR', country: 'IE', locale: 'en-IE' },
};
const maker: Session = { ...buyer, permissions: ['workshop:enter'] };

describe('where one lands after signing in', () => {
  beforeAll(() => {
    Object.assign(globalThis, { location: { origin: 'https://shop.example' } });
  });
  afterAll(() => {
    Reflect.deleteProperty(globalThis, 'location');
  });

  it('is where one came from', () => {
    expect(landing(buyer, '/shelf/curlew?page=2')).toBe('/shelf/curlew?page=2');
    expect(landing(maker, '/orders/1')).toBe('/orders/1');
  });

  it('is the shelf for buyers and the workshop for its staff, coming from nowhere', () => {
    expect(landing(buyer)).toBe('/shelf');
    expect(landing(maker)).toBe('/workshop');
  });

  it.each([
    'https://elsewhere.example/',
    '//elsewhere.example/',
    '/\\elsewhere.example/',
    '/\t/elsewhere.example/',
    '/\n/elsewhere.example/',
    'javascript:alert(1)',
    '',
  ])('is never another site: %j', (from) => expect(landing(buyer, from)).toBe('/shelf'));
});
