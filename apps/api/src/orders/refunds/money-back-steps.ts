import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';
import type { OrderRecord, TaxLine } from '../order-record.js';

/** Money of a paid order that went back, in the transaction that notes it. */
export interface MoneyBack {
  readonly order: OrderRecord;
  readonly refundId: string;
  readonly cause: 'refund' | 'dispute';
  readonly amountMinor: number;
  readonly at: Date;
  readonly lines: readonly {
    readonly orderLineId: string;
    readonly kitName: string;
    readonly licenceName: string;
    readonly amountMinor: number;
    /** The right to the line's files ends. */
    readonly endsRight: boolean;
  }[];
  /** What the steps find out, for the refund's record and the e-mail. */
  readonly facts: {
    creditNote?: { readonly id: string; readonly number: string };
    tax?: readonly TaxLine[];
    /** Kits whose right has ended with this, and those of which money went back and the right goes on, by name. */
    endedKits?: readonly string[];
    keptKits?: readonly string[];
  };
}

/** Run in the transaction in which money goes back, by the rooms that have their part in it. */
@Injectable()
export class MoneyBackSteps extends Steps<MoneyBack> {}
