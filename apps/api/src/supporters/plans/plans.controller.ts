import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { PlansView } from './plans-view.js';
import { SavePlan } from './save-plan.js';

@Controller()
export class PlansController {
  constructor(
    private readonly view: PlansView,
    private readonly save: SavePlan,
  ) {}

  @Endpoint('GET /plans')
  listOffered(@Input() { query }: Handled<'GET /plans'>): Promise<Answer<'GET /plans'>> {
    return this.view.offered(query);
  }

  @Endpoint('GET /workshop/plans')
  list(@Input() { query }: Handled<'GET /workshop/plans'>): Promise<Answer<'GET /workshop/plans'>> {
    return this.view.list(query);
  }

  @Endpoint('GET /workshop/plans/:planId')
  read(
    @Input() { params }: Handled<'GET /workshop/plans/:planId'>,
  ): Promise<Answer<'GET /workshop/plans/:planId'>> {
    return this.view.one(params.planId);
  }

  @Endpoint('POST /workshop/plans')
  create(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /workshop/plans'>,
  ): Promise<Answer<'POST /workshop/plans'>> {
    return this.save.create(person, body);
  }

  @Endpoint('PUT /workshop/plans/:planId')
  change(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /workshop/plans/:planId'>,
  ): Promise<Answer<'PUT /workshop/plans/:planId'>> {
    return this.save.change(person, params.planId, body);
  }
}
