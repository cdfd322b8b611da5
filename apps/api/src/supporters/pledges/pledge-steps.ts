import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';
import type { TaxLine } from './pledge-record.js';
import type { PledgeRights } from './rights.js';

/** A month in the transaction that writes its payment down. */
export interface PaidMonth {
  readonly paymentId: string;
  readonly pledgeId: string;
  readonly personId: string;
  readonly email: string;
  readonly name: string;
  readonly planName: string;
  readonly amountMinor: number;
  readonly currency: string;
  /** Where the supporter is, for tax: the country two pieces of evidence agree on, else the declared one. */
  readonly country: string;
  readonly periodStart: Date;
  readonly periodEnd: Date;
  readonly paidAt: Date;
  readonly writtenAt: Date;
  /** What the steps find out, for the e-mail and the pledge's page. */
  readonly facts: { receiptNumber?: string; tax?: readonly TaxLine[] };
}

/** Run in the transaction that writes a month's payment down. */
@Injectable()
export class PledgePaidSteps extends Steps<PaidMonth> {}

export interface PledgeShelf {
  readonly pledgeId: string;
  readonly personId: string;
  readonly email: string;
  readonly kitIds: readonly string[];
  /** Kits once given are not taken away by their not standing in the list: the plan has all. */
  readonly hasAllKits: boolean;
  readonly rights: PledgeRights;
  readonly paidUntil: Date | null;
}

/** Run in the transaction in which a pledge's rights change, or its plan's kits. May be run again. */
@Injectable()
export class PledgeRightsSteps extends Steps<PledgeShelf> {}
