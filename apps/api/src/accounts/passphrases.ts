import { Injectable } from '@nestjs/common';
import { Algorithm, hash, verify } from '@node-rs/argon2';
import { dictionary } from '@zxcvbn-ts/language-common';
import { InjectConfig, type Config } from '../config/config.js';
import { Refusal } from '../http/refusal.js';

/** OWASP's first choice for argon2id: 19 MiB, two passes, one lane. */
const COST = { algorithm: 2 satisfies Algorithm, memoryCost: 19_456, timeCost: 2, parallelism: 1 };
const MINIMUM = 15;

/** Hashing and judging passphrases. Length and commonness count; there are no rules of composition (NIST SP 800-63B-4). */
@Injectable()
export class Passphrases {
  private readonly common = new Set<string>(dictionary['passwords-common'].map((one) => String(one)));
  private decoy: Promise<string> | undefined;

  constructor(@InjectConfig() private readonly config: Config) {}

  /** @throws Refusal `passphrase-refused` that says why */
  check(passphrase: string, person: { email: string; name: string }): void {
    const plain = passphrase.normalize('NFKC').toLowerCase();
    if ([...plain].length < MINIMUM) throw refused('Use 15 characters or more; a short sentence is good.');
    const compact = plain.replace(/[\s._-]/g, '');
    const theirs = [
      person.email,
      person.email.split('@')[0] ?? '',
      person.name,
      this.config.WORKSHOP_NAME,
    ].map((one) => one.toLowerCase().replace(/[\s._-]/g, ''));
    if (this.common.has(plain) || this.common.has(compact) || isOneThingRepeated(compact, this.common))
      throw refused('This one is on the lists that are tried first. Choose a sentence of your own.');
    if (theirs.some((one) => one.length > 3 && compact.replaceAll(one, '').length < 5))
      throw refused(
        'Your name, your address or the workshop’s name alone are guessed at once. Add words of your own.',
      );
  }

  hash(passphrase: string): Promise<string> {
    return hash(passphrase.normalize('NFKC'), COST);
  }

  /** Takes as long for an unknown person as for a wrong passphrase, so that the time tells nothing. */
  async matches(passphrase: string, stored: string | null): Promise<boolean> {
    this.decoy ??= this.hash('a passphrase nobody has');
    const isRight = await verify(stored ?? (await this.decoy), passphrase.normalize('NFKC'));
    return stored !== null && isRight;
  }
}

const refused = (sentence: string): Refusal =>
  new Refusal('passphrase-refused', sentence, { fields: { passphrase: sentence } });

/** "aaaa…", "abcabc…", "passwordpassword": one short or common piece over and over. */
const isOneThingRepeated = (text: string, common: ReadonlySet<string>): boolean => {
  const length = (text + text).indexOf(text, 1);
  if (length === text.length) return false;
  return length <= 4 || common.has(text.slice(0, length));
};
