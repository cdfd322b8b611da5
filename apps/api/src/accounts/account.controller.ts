import { Controller, Req } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request } from 'express';
import { Transactions } from '../database/transactions.js';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { MailedLinks } from './mailed-links.js';
import { OwnSessions } from './own-sessions.js';
import { People } from './people.js';
import { SessionView } from './session-view.js';
import { SetPassphrase } from './set-passphrase.js';

@Controller()
export class AccountController {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly view: SessionView,
    private readonly passphrase: SetPassphrase,
    private readonly mailedLinks: MailedLinks,
    private readonly sessions: OwnSessions,
  ) {}

  @Endpoint('PATCH /account')
  async rename(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'PATCH /account'>,
  ): Promise<Answer<'PATCH /account'>> {
    await this.transactions.run(async (tx) => {
      const found = await this.people.byId(person.id, tx);
      if (found) await this.people.change(tx, found, { name: body.name });
    });
    return this.view.of({ ...person, name: body.name });
  }

  @Endpoint('POST /account/passphrase')
  setPassphrase(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /account/passphrase'>,
    @Req() request: Request,
  ): Promise<void> {
    return this.passphrase.byKnowing(person, body.current, body.next, request.sessionID);
  }

  @Endpoint('POST /account/verification')
  sendVerification(@ThisPerson() person: SignedIn): Promise<void> {
    return this.mailedLinks.resendVerification(person);
  }

  @Endpoint('GET /account/sessions')
  listSessions(
    @ThisPerson() person: SignedIn,
    @Req() request: Request,
  ): Promise<Answer<'GET /account/sessions'>> {
    return this.sessions.list(person.id, request.sessionID);
  }

  @Endpoint('DELETE /account/sessions')
  endOtherSessions(@ThisPerson() person: SignedIn, @Req() request: Request): Promise<void> {
    return this.sessions.endOthers(person.id, request.sessionID);
  }
}
