import type { EndpointKey } from '@windchest/contracts';

/** What is asked again after anything happened to a letter. */
export const letterAnswers: readonly EndpointKey[] = [
  'GET /workshop/letters',
  'GET /workshop/letters/:letterId',
  'GET /workshop/letters/:letterId/recipients',
  'GET /workshop/letters/:letterId/preview',
];
