import { problemStatus, type ProblemCode } from '@windchest/contracts';

/** A request that cannot be done, with a code of the contract and a sentence for the person who asked. */
export class Refusal extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly more: { readonly fields?: Record<string, string>; readonly retryAfterSeconds?: number } = {},
  ) {
    super(`${code}: ${detail}`);
  }

  get status(): number {
    return problemStatus[this.code];
  }
}

export const notFound = (what: string): Refusal => new Refusal('not-found', `There is no such ${what}.`);
