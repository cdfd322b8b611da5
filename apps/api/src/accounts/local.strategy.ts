import { Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import { signInBody } from '@windchest/contracts';
import type { Request } from 'express';
import { Strategy } from 'passport-local';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { Refusal } from '../http/refusal.js';
import { Passphrases } from './passphrases.js';
import { People, toSignedIn } from './people.js';

export const wrongCredentials = (): Refusal =>
  new Refusal('wrong-credentials', 'This address and this passphrase do not belong together.');

@Injectable()
export class LocalStrategy extends PassportStrategy(Strategy) {
  constructor(
    private readonly people: People,
    private readonly passphrases: Passphrases,
    private readonly limits: RateLimits,
  ) {
    super({ usernameField: 'email', passwordField: 'passphrase', passReqToCallback: true });
  }

  async validate(request: Request, givenEmail: string, givenPassphrase: string): Promise<SignedIn> {
    const body = signInBody.safeParse({ email: givenEmail, passphrase: givenPassphrase });
    if (!body.success) throw wrongCredentials();
    await this.limits.take('sign-in', body.data.email);
    await this.limits.take('sign-in-address', request.ip ?? 'unknown');
    const person = await this.people.byEmail(body.data.email);
    if (!(await this.passphrases.matches(body.data.passphrase, person?.passphraseHash ?? null)) || !person)
      throw wrongCredentials();
    return toSignedIn(person);
  }
}
