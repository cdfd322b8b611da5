import { Controller } from '@nestjs/common';
import type { Answer } from '@windchest/contracts';
import { Endpoint } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { Overviews } from './overview.js';

@Controller()
export class WorkshopController {
  constructor(private readonly overviews: Overviews) {}

  @Endpoint('GET /workshop/overview')
  overview(@ThisPerson() person: SignedIn): Promise<Answer<'GET /workshop/overview'>> {
    return this.overviews.read(person);
  }
}
