import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { ChangedParts } from './changed-parts.js';
import { ReprintPlans } from './reprint-plans.js';

@Controller()
export class PrintRecordController {
  constructor(
    private readonly plans: ReprintPlans,
    private readonly changedParts: ChangedParts,
  ) {}

  @Endpoint('GET /shelf/:slug/reprint')
  plan(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /shelf/:slug/reprint'>,
  ): Promise<Answer<'GET /shelf/:slug/reprint'>> {
    return this.plans.plan(person, params.slug, query.revision);
  }

  @Endpoint('GET /shelf/:slug/printed')
  read(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /shelf/:slug/printed'>,
  ): Promise<Answer<'GET /shelf/:slug/printed'>> {
    return this.plans.printed(person, params.slug, query.revision);
  }

  @Endpoint('PUT /shelf/:slug/printed')
  say(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /shelf/:slug/printed'>,
  ): Promise<Answer<'PUT /shelf/:slug/printed'>> {
    return this.plans.sayPrinted(person, params.slug, body);
  }

  @Endpoint('DELETE /shelf/:slug/printed')
  forget(
    @ThisPerson() person: SignedIn,
    @Input() { params }: Handled<'DELETE /shelf/:slug/printed'>,
  ): Promise<void> {
    return this.plans.forget(person, params.slug);
  }

  @Endpoint('GET /shelf/:slug/changed-parts')
  look(
    @ThisPerson() person: SignedIn,
    @Input() { params, query }: Handled<'GET /shelf/:slug/changed-parts'>,
  ): Promise<Answer<'GET /shelf/:slug/changed-parts'>> {
    return this.changedParts.look(person, params.slug, query.revision);
  }

  @Endpoint('POST /shelf/:slug/changed-parts')
  ask(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'POST /shelf/:slug/changed-parts'>,
  ): Promise<Answer<'POST /shelf/:slug/changed-parts'>> {
    return this.changedParts.ask(person, params.slug, body.revisionId);
  }
}
