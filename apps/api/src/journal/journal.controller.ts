import { Controller, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { Feeds } from './feeds.js';
import { PostPictures } from './post-pictures.js';
import { ReadJournal } from './read-journal.js';

@Controller()
export class JournalController {
  constructor(
    private readonly journal: ReadJournal,
    private readonly pictures: PostPictures,
    private readonly feeds: Feeds,
  ) {}

  @Endpoint('GET /journal')
  list(
    @MaybePerson() person: SignedIn | null,
    @Input() input: Handled<'GET /journal'>,
  ): Promise<Answer<'GET /journal'>> {
    return this.journal.list(person, input);
  }

  @Endpoint('GET /journal.atom')
  async feed(@Res() response: Response): Promise<void> {
    sendAtom(response, await this.feeds.journal());
  }

  @Endpoint('GET /kits/:slug/revisions.atom')
  async revisions(
    @Input() { params }: Handled<'GET /kits/:slug/revisions.atom'>,
    @Res() response: Response,
  ): Promise<void> {
    sendAtom(response, await this.feeds.revisionsOf(params.slug));
  }

  @Endpoint('GET /journal/pictures/:pictureId')
  picture(
    @MaybePerson() person: SignedIn | null,
    @Input() { params }: Handled<'GET /journal/pictures/:pictureId'>,
    @Res() response: Response,
  ): Promise<void> {
    return this.pictures.send(person, params.pictureId, response);
  }

  @Endpoint('GET /journal/:slug')
  read(
    @MaybePerson() person: SignedIn | null,
    @Input() { params }: Handled<'GET /journal/:slug'>,
  ): Promise<Answer<'GET /journal/:slug'>> {
    return this.journal.one(person, params.slug);
  }
}

/** Express adds the ETag, so that feed readers that ask every hour are told that nothing is new. */
const sendAtom = (response: Response, document: string): void => {
  response.setHeader('Cache-Control', 'public, max-age=300');
  response.type('application/atom+xml; charset=utf-8').send(document);
};
