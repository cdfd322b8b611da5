import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';

/** What a dispute means for the rights that an order gave. */
export interface DisputeTurn {
  readonly orderId: string;
  readonly rights: 'rest' | 'go-on' | 'end';
}

/** Run in the transaction in which a dispute turns, by the rooms that have their part in it. */
@Injectable()
export class DisputeSteps extends Steps<DisputeTurn> {}
