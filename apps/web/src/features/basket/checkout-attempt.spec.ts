import { attemptFor, dropAttempt, newAttempt, type WhatIsOrdered } from './checkout-attempt.js';

const ordered: WhatIsOrdered = {
  licenceIds: ['b', 'a'],
  couponCode: 'WINDFALL',
  email: 'ada@saltmarsh.example',
  country: 'IE',
};

function memory() {
  const values = new Map<string, string>();
  const storage = {
    getItem: (key: string) => values.get(key) ?? null,
    setItem: (key: string, value: string) => void values.set(key, value),
    removeItem: (key: string) => void values.delete(key),
  };
  return () => storage;
}
const refused = () => {
  throw new Error('Storage is refused.');
};

describe('the attempt an order is sent with', () => {
  it('is a version 4 UUID, each time another', () => {
    const made = Array.from({ length: 50 }, newAttempt);
    for (const one of made)
      expect(one).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(new Set(made).size).toBe(50);
  });

  it('stays the same while the same is ordered, whatever the order of the lines', () => {
    const storage = memory();
    const first = attemptFor(ordered, storage);
    expect(attemptFor({ ...ordered, licenceIds: ['a', 'b'] }, storage)).toBe(first);
    expect(attemptFor({ ...ordered, email: ' Ada@Saltmarsh.example ' }, storage)).toBe(first);
  });

  it('is a new one when basket, code, address or country change', () => {
    for (const change of [
      { licenceIds: ['a'] },
      { couponCode: undefined },
      { email: 'bo@saltmarsh.example' },
      { country: 'FR' },
      { business: { name: 'Reed Works', address: 'Deichweg 3', vatNumber: '' } },
      { gift: { email: 'wren@mail.example', giver: 'Ada', greeting: 'For you.' } },
    ]) {
      const storage = memory();
      const first = attemptFor(ordered, storage);
      expect(attemptFor({ ...ordered, ...change }, storage)).not.toBe(first);
    }
  });

  it('is a new one after the order is over', () => {
    const storage = memory();
    const first = attemptFor(ordered, storage);
    dropAttempt(storage);
    expect(attemptFor(ordered, storage)).not.toBe(first);
  });

  it('lives as long as the page where the browser keeps nothing', () => {
    const first = attemptFor(ordered, refused);
    expect(attemptFor(ordered, refused)).toBe(first);
    dropAttempt(refused);
    expect(attemptFor(ordered, refused)).not.toBe(first);
  });

  it('bears a damaged storage', () => {
    dropAttempt(memory());
    const storage = memory();
    storage().setItem('windchest.checkout-attempt', '{not json');
    expect(attemptFor(ordered, storage)).toMatch(/^[0-9a-f-]{36}$/);
  });
});
