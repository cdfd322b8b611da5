import { Injectable } from '@nestjs/common';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { OneTimeTokens } from './one-time-tokens.js';
import type { Person } from './person.model.js';

const VERIFY_HOURS = 48;
const SIGN_IN_MINUTES = 20;
const RESET_MINUTES = 60;
const INVITE_DAYS = 7;

/** Issues the one-time links of accounts and mails them. */
@Injectable()
export class AccountLinks {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly tokens: OneTimeTokens,
    private readonly mails: MailOutbox,
  ) {}

  async sendVerification(tx: Tx, person: Person): Promise<void> {
    const { id, placeholder } = await this.tokens.issue(tx, person.id, 'verify', VERIFY_HOURS * 60);
    const message = {
      template: 'verify-address',
      name: person.name,
      link: this.page('verify', placeholder),
      hours: VERIFY_HOURS,
    } as const;
    await this.mails.add(tx, { to: person.email, message, key: `verify:${id}` });
  }

  async sendSignIn(tx: Tx, person: Person): Promise<void> {
    const { id, placeholder } = await this.tokens.issue(tx, person.id, 'sign-in', SIGN_IN_MINUTES);
    const message = {
      template: 'sign-in-link',
      link: this.page('sign-in/link', placeholder),
      minutes: SIGN_IN_MINUTES,
    } as const;
    await this.mails.add(tx, { to: person.email, message, key: `sign-in:${id}` });
  }

  async sendReset(tx: Tx, person: Person): Promise<void> {
    const { id, placeholder } = await this.tokens.issue(tx, person.id, 'reset', RESET_MINUTES);
    const message = {
      template: 'reset-passphrase',
      link: this.page('reset', placeholder),
      minutes: RESET_MINUTES,
    } as const;
    await this.mails.add(tx, { to: person.email, message, key: `reset:${id}` });
  }

  /** Somebody tried to join with an address that has an account: only its owner hears of it. */
  async sendAlreadyJoined(tx: Tx, person: Person): Promise<void> {
    const signIn = await this.tokens.issue(tx, person.id, 'sign-in', SIGN_IN_MINUTES);
    const reset = await this.tokens.issue(tx, person.id, 'reset', RESET_MINUTES);
    const message = {
      template: 'address-already-joined',
      name: person.name,
      signInLink: this.page('sign-in/link', signIn.placeholder),
      resetLink: this.page('reset', reset.placeholder),
    } as const;
    await this.mails.add(tx, { to: person.email, message, key: `already-joined:${signIn.id}` });
  }

  async sendInvitation(tx: Tx, person: Person, invitedBy: string): Promise<void> {
    const { id, placeholder } = await this.tokens.issue(tx, person.id, 'invite', INVITE_DAYS * 24 * 60);
    const message = {
      template: 'staff-invite',
      name: person.name,
      role: person.role,
      invitedBy,
      link: this.page('reset', placeholder),
      days: INVITE_DAYS,
    } as const;
    await this.mails.add(tx, { to: person.email, message, key: `invite:${id}` });
  }

  async sendPassphraseChanged(tx: Tx, person: Person, when: Date): Promise<void> {
    const message = {
      template: 'passphrase-changed',
      name: person.name,
      when: when.toISOString(),
      resetLink: `${this.config.BASE_URL}/forgot`,
    } as const;
    await this.mails.add(tx, {
      to: person.email,
      message,
      key: `passphrase-changed:${person.id}:${when.getTime()}`,
    });
  }

  /** The token stands behind `#`, so that no server or proxy on the way ever logs it. */
  private page(path: string, placeholder: string): string {
    return `${this.config.BASE_URL}/${path}#token=${placeholder}`;
  }
}
