import { secretIn } from './hash-secret.js';

const secret = 'Zm9yIHRlc3RzIG9ubHksIDI1NiBiaXRzIG9mIHNhbHQ';

describe('the secret behind the # of a mailed link', () => {
  it('is found by its name', () => {
    expect(secretIn(`#token=${secret}`, 'token')).toBe(secret);
    expect(secretIn(`#a=1&key=${secret}`, 'key')).toBe(secret);
  });

  it('is nothing where the name differs or no fragment stands', () => {
    expect(secretIn(`#token=${secret}`, 'key')).toBeUndefined();
    expect(secretIn('', 'token')).toBeUndefined();
  });

  it('is nothing where the address was cut off or added to', () => {
    expect(secretIn(`#token=${secret.slice(0, -1)}`, 'token')).toBeUndefined();
    expect(secretIn(`#token=${secret}x`, 'token')).toBeUndefined();
    expect(secretIn(`#token=${secret.slice(0, -1)}.`, 'token')).toBeUndefined();
  });
});
