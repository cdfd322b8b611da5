import { Controller, Headers, Ip, Req, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Request, Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { NewsReaders } from './news-readers.js';
import { ReadLetters } from './read-letters.js';
import { RevisionWatchers } from './revision-watchers.js';
import { StopMails } from './stop-mails.js';
import { TakeBounce } from './take-bounce.js';

/** For readers: asking for letters, reading them again, ending them; and for the mail server's reports. */
@Controller()
export class NewsController {
  constructor(
    private readonly news: NewsReaders,
    private readonly watchers: RevisionWatchers,
    private readonly stopMails: StopMails,
    private readonly letters: ReadLetters,
    private readonly bounces: TakeBounce,
  ) {}

  @Endpoint('POST /news')
  ask(@Input() { body }: Handled<'POST /news'>, @Ip() network: string): Promise<void> {
    return this.news.ask(body.email, network);
  }

  @Endpoint('POST /news/confirmation')
  confirm(
    @Input() { body }: Handled<'POST /news/confirmation'>,
    @Ip() network: string,
  ): Promise<Answer<'POST /news/confirmation'>> {
    return this.news.confirm(body.token, network);
  }

  @Endpoint('GET /account/news')
  readNews(@ThisPerson() person: SignedIn): Promise<Answer<'GET /account/news'>> {
    return this.news.stateOf(person);
  }

  @Endpoint('PUT /account/news')
  setNews(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'PUT /account/news'>,
  ): Promise<Answer<'PUT /account/news'>> {
    return this.news.setWanted(person, body.isWanted);
  }

  @Endpoint('GET /shelf/:slug/watching')
  readWatching(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'GET /shelf/:slug/watching'>,
  ): Promise<Answer<'GET /shelf/:slug/watching'>> {
    return this.watchers.stateOf(person, params.slug);
  }

  @Endpoint('PUT /shelf/:slug/watching')
  setWatching(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /shelf/:slug/watching'>,
  ): Promise<Answer<'PUT /shelf/:slug/watching'>> {
    return this.watchers.set(person, params.slug, body.isOn);
  }

  @Endpoint('GET /unsubscribe/:token')
  leadToPage(@Input() { params }: Handled<'GET /unsubscribe/:token'>, @Res() response: Response): void {
    response.redirect(303, `/unsubscribe/${params.token}`);
  }

  @Endpoint('POST /unsubscribe/:token')
  stop(@Input() { params }: Handled<'POST /unsubscribe/:token'>): Promise<void> {
    return this.stopMails.stop(params.token);
  }

  @Endpoint('GET /unsubscribe/:token/about')
  about(
    @Input() { params }: Handled<'GET /unsubscribe/:token/about'>,
    @Ip() network: string,
  ): Promise<Answer<'GET /unsubscribe/:token/about'>> {
    return this.stopMails.about(params.token, network);
  }

  @Endpoint('GET /letters')
  archive(@Input() input: Handled<'GET /letters'>): Promise<Answer<'GET /letters'>> {
    return this.letters.archive(input);
  }

  @Endpoint('GET /letters/:slug')
  archived(@Input() { params }: Handled<'GET /letters/:slug'>): Promise<Answer<'GET /letters/:slug'>> {
    return this.letters.archived(params.slug);
  }

  @Endpoint('GET /account/letters')
  own(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'GET /account/letters'>,
  ): Promise<Answer<'GET /account/letters'>> {
    return this.letters.own(person, input);
  }

  @Endpoint('GET /account/letters/:recipientId')
  ownOne(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'GET /account/letters/:recipientId'>,
  ): Promise<Answer<'GET /account/letters/:recipientId'>> {
    return this.letters.ownOne(person, params.recipientId);
  }

  @Endpoint('POST /mails/bounces')
  takeBounce(
    @Req() request: Request,
    @Headers('x-windchest-signature') signature: string | undefined,
  ): Promise<void> {
    return this.bounces.take(request, signature);
  }
}
