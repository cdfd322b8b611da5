import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectConfig, type Config } from '../../config/config.js';

export type TokenPurpose = 'collect' | 'verify' | 'sign-in' | 'reset' | 'invite' | 'order-key' | 'confirm-news' | 'stop-news' | 'stop-revisions';

/**
 * Secrets that are mailed or handed out: 256 bits, derived from the installation's link secret and
 * the row's random id, so that the database keeps only their hash and an e-mail sent again after a
 * crash carries the same link.
 */
@Injectable()
export class LinkTokens {
  constructor(@InjectConfig() private readonly config: Config) {}

  /** @returns 43 characters, base64url */
  tokenOf(purpose: TokenPurpose, rowId: string): string {
    return createHmac('sha256', this.config.LINK_SECRET).update(`${purpose}:${rowId}`).digest('base64url');
  }

  /** @returns 64 hex digits, as the database keeps it */
  hashOf(token: string): string {
    return createHash('sha256').update(token).digest('hex');
  }

  /** Signs a short text, for addresses that carry their own facts. */
  sign(text: string): string {
    return createHmac('sha256', this.config.LINK_SECRET).update(`signed:${text}`).digest('base64url');
  }

  isSignatureOf(text: string, signature: string): boolean {
    const expected = Buffer.from(this.sign(text));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  }
}

const PLACEHOLDER = /\{token:([a-z-]+):([0-9a-f-]{36})\}/g;

/** What a queued e-mail carries in place of a secret until it is sent. */
export const tokenPlaceholder = (purpose: TokenPurpose, rowId: string): string =>
  `{token:${purpose}:${rowId}}`;

/** Puts the secrets into all strings of a queued message. */
export const withTokens = <T>(message: T, tokens: Pick<LinkTokens, 'tokenOf'>): T =>
  JSON.parse(
    JSON.stringify(message).replace(PLACEHOLDER, (_, purpose: string, rowId: string) =>
      tokens.tokenOf(purpose as TokenPurpose, rowId),
    ),
  ) as T;
