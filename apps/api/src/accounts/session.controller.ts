import { Controller, Ip, Req, Res, UseGuards } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { Join } from './join.js';
import { MailedLinks } from './mailed-links.js';
import { SessionView } from './session-view.js';
import { SetPassphrase } from './set-passphrase.js';
import { SignInGuard } from './sign-in.guard.js';
import { endSession, startSession } from './start-session.js';

@Controller()
export class SessionController {
  constructor(
    private readonly view: SessionView,
    private readonly joining: Join,
    private readonly mailedLinks: MailedLinks,
    private readonly passphrase: SetPassphrase,
  ) {}

  @Endpoint('GET /session')
  read(@MaybePerson() person: SignedIn | null): Answer<'GET /session'> {
    return this.view.of(person);
  }

  @Endpoint('POST /session')
  @UseGuards(SignInGuard)
  signIn(@MaybePerson() person: SignedIn | null): Answer<'POST /session'> {
    return this.view.of(person);
  }

  @Endpoint('DELETE /session')
  async signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    await endSession(request);
    response.clearCookie('windchest', { path: '/' });
  }

  @Endpoint('POST /session/from-link')
  async signInFromLink(
    @Input() { body }: Handled<'POST /session/from-link'>,
    @Req() request: Request,
  ): Promise<Answer<'GET /session'>> {
    return this.begin(request, await this.mailedLinks.use(body.token, 'sign-in', request.ip ?? ''));
  }

  @Endpoint('POST /accounts')
  join(@Input() { body }: Handled<'POST /accounts'>, @Ip() network: string): Promise<void> {
    return this.joining.join(body, network);
  }

  @Endpoint('POST /accounts/verify')
  async verify(
    @Input() { body }: Handled<'POST /accounts/verify'>,
    @Req() request: Request,
  ): Promise<Answer<'GET /session'>> {
    return this.begin(request, await this.mailedLinks.use(body.token, 'verify', request.ip ?? ''));
  }

  @Endpoint('POST /accounts/sign-in-links')
  requestSignInLink(
    @Input() { body }: Handled<'POST /accounts/sign-in-links'>,
    @Ip() network: string,
  ): Promise<void> {
    return this.mailedLinks.requestSignIn(body.email, network);
  }

  @Endpoint('POST /accounts/forgotten')
  forgotten(@Input() { body }: Handled<'POST /accounts/forgotten'>, @Ip() network: string): Promise<void> {
    return this.mailedLinks.requestReset(body.email, network);
  }

  @Endpoint('POST /accounts/reset')
  async reset(
    @Input() { body }: Handled<'POST /accounts/reset'>,
    @Req() request: Request,
  ): Promise<Answer<'GET /session'>> {
    return this.begin(request, await this.passphrase.byLink(body.token, body.passphrase, request.ip ?? ''));
  }

  private async begin(request: Request, person: SignedIn): Promise<Answer<'GET /session'>> {
    await startSession(request, person);
    return this.view.of(person);
  }
}
