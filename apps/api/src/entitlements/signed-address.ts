import { Injectable } from '@nestjs/common';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { Refusal } from '../http/refusal.js';

export interface AddressFacts {
  readonly downloadId: string;
  /** Seconds since 1970. */
  readonly expires: number;
  /**
   * Who may use it: the person signed in, or the browser that holds a cookie given out with it. An
   * address that leaks is worth nothing to others.
   */
  readonly boundTo: { readonly person: string } | { readonly browser: string };
}

/** Short-lived signed addresses of files. They carry their own facts; nothing is looked up to refuse a forged one. */
@Injectable()
export class SignedAddress {
  constructor(
    private readonly tokens: LinkTokens,
    private readonly clock: Clock,
  ) {}

  write(facts: AddressFacts): string {
    const text = Buffer.from(JSON.stringify(facts)).toString('base64url');
    return `${text}.${this.tokens.sign(text)}`;
  }

  /** @throws Refusal `not-found` for a forged one, `link-has-expired` for an old one */
  read(grant: string): AddressFacts {
    const [text = '', signature = ''] = grant.split('.');
    if (!this.tokens.isSignatureOf(text, signature))
      throw new Refusal('not-found', 'There is no file at this address.');
    const facts = JSON.parse(Buffer.from(text, 'base64url').toString()) as AddressFacts;
    if (facts.expires * 1000 <= this.clock.now().getTime())
      throw new Refusal(
        'link-has-expired',
        'This address was good for a short while only. Go back to the page and press the button again.',
      );
    return facts;
  }
}
