import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { FileGrants } from './file-grants.js';
import { Shelf } from './shelf.js';

@Controller()
export class ShelfController {
  constructor(
    private readonly shelf: Shelf,
    private readonly grants: FileGrants,
  ) {}

  @Endpoint('GET /shelf')
  list(
    @ThisPerson() person: SignedIn,
    @Input() { query }: Handled<'GET /shelf'>,
  ): Promise<Answer<'GET /shelf'>> {
    return this.shelf.list(person, query.page);
  }

  @Endpoint('GET /shelf/owned')
  owned(@ThisPerson() person: SignedIn): Promise<Answer<'GET /shelf/owned'>> {
    return this.shelf.ownedSlugs(person);
  }

  @Endpoint('GET /shelf/:slug')
  read(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'GET /shelf/:slug'>,
  ): Promise<Answer<'GET /shelf/:slug'>> {
    return this.shelf.read(person, params.slug);
  }

  @Endpoint('POST /shelf/:slug/held')
  sayHeld(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /shelf/:slug/held'>,
  ): Promise<Answer<'GET /shelf/:slug'>> {
    return this.shelf.sayHeld(person, params.slug, body.revisionId);
  }

  @Endpoint('PUT /shelf/:slug/clearance')
  sayClearance(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /shelf/:slug/clearance'>,
  ): Promise<Answer<'GET /shelf/:slug'>> {
    return this.shelf.sayClearance(person, params.slug, body.clearance);
  }

  @Endpoint('POST /shelf/grants')
  grant(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /shelf/grants'>,
  ): Promise<Answer<'POST /shelf/grants'>> {
    return this.grants.forPerson(person, body);
  }
}
