import type { EndpointKey } from '@windchest/contracts';

/** What a change of a rate makes stale. */
export const rateAnswers: readonly EndpointKey[] = [
  'GET /workshop/ledger/rates',
  'GET /workshop/ledger/rates/missing',
  'GET /workshop/ledger/rates/changes',
  'GET /workshop/ledger/quarters/:year/:quarter',
];
