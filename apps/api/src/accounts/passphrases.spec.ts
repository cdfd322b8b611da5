import type { Config } from '../config/config.js';
import { Passphrases } from './passphrases.js';

const passphrases = new Passphrases({ WORKSHOP_NAME: 'Saltmarsh Sound Works' } as Config);
const person = { email: 'wren.fairweather@mail.example', name: 'Wren Fairweather' };
const check = (passphrase: string) => () => passphrases.check(passphrase, person);

describe('a passphrase', () => {
  it('may be any sentence of 15 characters, without rules of composition', () => {
    expect(check('the tide was out by nine')).not.toThrow();
    expect(check('ebb tide at nine')).not.toThrow();
    expect(check('моряки ушли на рассвете')).not.toThrow();
  });

  it('is refused when short, counted in characters and not in bytes', () => {
    expect(check('short tide')).toThrow(/15 characters/);
    expect(check('ééééééééé')).toThrow(/15 characters/);
  });

  it('is refused when it is on the lists of common ones or one piece over and over', () => {
    expect(check('passwordpassword')).toThrow(/tried first/);
    expect(check('aaaaaaaaaaaaaaaaaaaa')).toThrow(/tried first/);
    expect(check('1234 1234 1234 1234')).toThrow(/tried first/);
    expect(check('qwertyuiop123456789')).not.toThrow(/15 characters/);
  });

  it('is refused when it is little more than the person’s own name or address, or the workshop’s', () => {
    expect(check('wren fairweather 1')).toThrow(/guessed at once/);
    expect(check('Saltmarsh Sound Works')).toThrow(/guessed at once/);
  });

  it('is kept as argon2id and matched again', async () => {
    const hash = await passphrases.hash('the tide was out by nine');
    expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await passphrases.matches('the tide was out by nine', hash)).toBe(true);
    expect(await passphrases.matches('the tide was out by ten', hash)).toBe(false);
    expect(await passphrases.matches('a passphrase nobody has', null)).toBe(false);
  });
});
