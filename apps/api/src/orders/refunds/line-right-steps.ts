import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';

/** How the right that a line of an order gave stands from now on. */
export interface LineRight {
  readonly orderLineId: string;
  readonly right: 'active' | 'suspended' | 'ended';
}

/** Run in the transaction in which staff decide on rights, by the room that keeps them. */
@Injectable()
export class LineRightSteps extends Steps<readonly LineRight[]> {}
