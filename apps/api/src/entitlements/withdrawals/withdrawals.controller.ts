import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { Withdrawals } from './withdrawals.js';

@Controller()
export class WithdrawalsController {
  constructor(private readonly withdrawals: Withdrawals) {}

  @Endpoint('GET /workshop/revisions/:revisionId/withdrawal')
  count(
    @Input() { params }: Handled<'GET /workshop/revisions/:revisionId/withdrawal'>,
  ): Promise<Answer<'GET /workshop/revisions/:revisionId/withdrawal'>> {
    return this.withdrawals.count(params.revisionId);
  }
}
