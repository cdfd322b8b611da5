import { z } from 'zod';

/** Error codes and the HTTP status each is answered with: the one table (RFC 9457 bodies carry the code). */
export const problemStatus = {
  'bad-request': 400,
  'validation-failed': 422,
  'not-signed-in': 401,
  'wrong-credentials': 401,
  forbidden: 403,
  'cross-site-refused': 403,
  'not-found': 404,
  'method-not-allowed': 405,
  conflict: 409,
  'already-exists': 409,
  'revision-is-released': 409,
  'gates-are-open': 409,
  'file-refused': 422,
  'file-too-large': 413,
  'revision-too-large': 413,
  'upload-broken-off': 400,
  'link-is-used-up': 410,
  'link-has-expired': 410,
  'address-not-verified': 403,
  'passphrase-refused': 422,
  'coupon-unknown': 404,
  'coupon-not-started': 409,
  'coupon-has-ended': 409,
  'coupon-is-used-up': 409,
  'coupon-does-not-apply': 409,
  'coupon-buyer-limit': 409,
  'coupon-for-supporters': 409,
  'coupon-basket-too-small': 409,
  'coupon-refused': 422,
  'basket-is-empty': 422,
  'basket-has-gone': 409,
  'gift-refused': 422,
  'quarter-is-closed': 409,
  'order-is-final': 409,
  'letter-is-final': 409,
  'refund-refused': 422,
  'plan-refused': 422,
  'pledge-exists': 409,
  'pledge-cannot': 409,
  'payment-unreachable': 502,
  'payment-refused': 402,
  'signature-refused': 400,
  'range-not-satisfiable': 416,
  'too-many-requests': 429,
  'busy-try-again': 503,
  internal: 500,
} as const satisfies Record<string, number>;

export type ProblemCode = keyof typeof problemStatus;

/** The one error body, `application/problem+json`. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.enum(Object.keys(problemStatus) as [ProblemCode, ...ProblemCode[]]),
  detail: z.string(),
  requestId: z.string(),
  /** Sentences by field path, for forms. */
  fields: z.record(z.string(), z.string()).optional(),
});
export type Problem = z.output<typeof problemSchema>;
