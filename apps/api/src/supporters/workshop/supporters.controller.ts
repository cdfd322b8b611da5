import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ListSupporters } from './list-supporters.js';
import { ShowSupporter } from './show-supporter.js';
import { SupporterFigures } from './supporter-figures.js';

@Controller()
export class SupportersController {
  constructor(
    private readonly listing: ListSupporters,
    private readonly figures: SupporterFigures,
    private readonly showing: ShowSupporter,
  ) {}

  @Endpoint('GET /workshop/supporters')
  list(@Input() { query }: Handled<'GET /workshop/supporters'>): Promise<Answer<'GET /workshop/supporters'>> {
    return this.listing.page(query);
  }

  @Endpoint('GET /workshop/supporter-figures')
  readFigures(): Promise<Answer<'GET /workshop/supporter-figures'>> {
    return this.figures.read();
  }

  @Endpoint('GET /workshop/supporters/:pledgeId')
  read(
    @Input() { params }: Handled<'GET /workshop/supporters/:pledgeId'>,
  ): Promise<Answer<'GET /workshop/supporters/:pledgeId'>> {
    return this.showing.show(params.pledgeId);
  }

  @Endpoint('GET /workshop/supporters/:pledgeId/payments')
  payments(
    @Input() { params, query }: Handled<'GET /workshop/supporters/:pledgeId/payments'>,
  ): Promise<Answer<'GET /workshop/supporters/:pledgeId/payments'>> {
    return this.showing.paymentsOf(params.pledgeId, query);
  }
}
