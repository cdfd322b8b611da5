import { Readable } from 'node:stream';
import { Controller, Res, StreamableFile } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import type { Response } from 'express';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { Audience } from './audience.js';
import { DeadAddresses } from './dead-addresses.js';
import { LetterChoices } from './letter-choices.js';
import { ListRecipients } from './list-recipients.js';
import { PreviewLetter } from './preview-letter.js';
import { ShowLetters } from './show-letters.js';
import { WriteLetters } from './write-letters.js';

/** Nothing in a letter may act or ask anybody else for anything, also when it is looked at here. */
const MAIL_POLICY =
  "default-src 'none'; style-src 'unsafe-inline'; img-src https: data:; frame-ancestors 'self'; sandbox allow-popups";

@Controller()
export class WorkshopLettersController {
  constructor(
    private readonly show: ShowLetters,
    private readonly write: WriteLetters,
    private readonly choices: LetterChoices,
    private readonly audience: Audience,
    private readonly preview: PreviewLetter,
    private readonly recipients: ListRecipients,
    private readonly dead: DeadAddresses,
  ) {}

  @Endpoint('GET /workshop/letters')
  list(@Input() input: Handled<'GET /workshop/letters'>): Promise<Answer<'GET /workshop/letters'>> {
    return this.show.list(input);
  }

  @Endpoint('POST /workshop/letters')
  draft(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /workshop/letters'>,
  ): Promise<Answer<'POST /workshop/letters'>> {
    return this.write.draft(person, body);
  }

  @Endpoint('GET /workshop/letters/choices')
  choose(): Promise<Answer<'GET /workshop/letters/choices'>> {
    return this.choices.all();
  }

  @Endpoint('POST /workshop/letters/audience')
  reach(
    @Input() input: Handled<'POST /workshop/letters/audience'>,
  ): Promise<Answer<'POST /workshop/letters/audience'>> {
    return this.audience.show(input);
  }

  @Endpoint('GET /workshop/letters/:letterId')
  read(
    @Input() { params }: Handled<'GET /workshop/letters/:letterId'>,
  ): Promise<Answer<'GET /workshop/letters/:letterId'>> {
    return this.show.one(params.letterId);
  }

  @Endpoint('PUT /workshop/letters/:letterId')
  change(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /workshop/letters/:letterId'>,
  ): Promise<Answer<'PUT /workshop/letters/:letterId'>> {
    return this.write.change(person, params.letterId, body);
  }

  @Endpoint('DELETE /workshop/letters/:letterId')
  delete(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/letters/:letterId'>,
  ): Promise<void> {
    return this.write.delete(person, params.letterId);
  }

  @Endpoint('GET /workshop/letters/:letterId/preview')
  look(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /workshop/letters/:letterId/preview'>,
  ): Promise<Answer<'GET /workshop/letters/:letterId/preview'>> {
    return this.preview.show(person, params.letterId, query.reader);
  }

  @Endpoint('GET /workshop/letters/:letterId/preview.html')
  async lookAtHtml(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /workshop/letters/:letterId/preview.html'>,
    @Res() response: Response,
  ): Promise<void> {
    const { html } = await this.preview.show(person, params.letterId, query.reader);
    response.setHeader('Content-Security-Policy', MAIL_POLICY);
    response.setHeader('X-Frame-Options', 'SAMEORIGIN');
    response.setHeader('Cache-Control', 'no-store');
    response.type('text/html; charset=utf-8').send(html);
  }

  @Endpoint('POST /workshop/letters/:letterId/test')
  test(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /workshop/letters/:letterId/test'>,
  ): Promise<void> {
    return this.preview.mailToSelf(person, params.letterId, body.reader ?? undefined);
  }

  @Endpoint('GET /workshop/letters/:letterId/recipients')
  listRecipients(
    @Input() { params, query }: Handled<'GET /workshop/letters/:letterId/recipients'>,
  ): Promise<Answer<'GET /workshop/letters/:letterId/recipients'>> {
    return this.recipients.page(params.letterId, query);
  }

  @Endpoint('GET /workshop/letters/:letterId/recipients.csv')
  recipientsCsv(
    @Input() { params, query }: Handled<'GET /workshop/letters/:letterId/recipients.csv'>,
  ): StreamableFile {
    return new StreamableFile(
      Readable.from(this.recipients.csv(params.letterId, query), { objectMode: false }),
      { type: 'text/csv; charset=utf-8', disposition: 'attachment; filename="letter-recipients.csv"' },
    );
  }

  @Endpoint('GET /workshop/dead-addresses')
  listDead(
    @Input() input: Handled<'GET /workshop/dead-addresses'>,
  ): Promise<Answer<'GET /workshop/dead-addresses'>> {
    return this.dead.list(input);
  }

  @Endpoint('DELETE /workshop/dead-addresses/:addressId')
  lift(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /workshop/dead-addresses/:addressId'>,
  ): Promise<void> {
    return this.dead.lift(person, params.addressId);
  }
}
