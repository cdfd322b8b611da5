import { createHash } from 'node:crypto';
import type { StandIn } from '../stand-in.js';
import type { IdempotentAnswer } from '../state/records.js';
import { ApiError } from './errors.js';

const keptMs = 24 * 3600 * 1000;

export type KeyLookup = { replay: IdempotentAnswer } | { claim: IdempotentAnswer };

/**
 * Looks a key up: either the kept answer to give again, or a fresh claim to work under.
 * @throws ApiError 400 where the key was used for something else, 409 where its first call is still running
 */
export function claimKey(
  standIn: StandIn,
  key: string,
  path: string,
  body: string,
  requestId: string,
): KeyLookup {
  const answers = standIn.state.idempotentAnswers;
  for (const old of answers.oldestFirst()) {
    if (standIn.clock.flowingMs() - old.createdMs < keptMs) break;
    answers.remove(old.id);
  }
  if (key.length > 255) {
    throw new ApiError(400, {
      type: 'idempotency_error',
      message: 'Idempotency keys have at most 255 characters.',
    });
  }
  const bodyHash = createHash('sha256').update(body).digest('hex');
  const known = answers.find(key);
  if (!known) {
    const createdMs = standIn.clock.flowingMs();
    return { claim: answers.add({ id: key, path, bodyHash, createdMs, requestId, answer: null }) };
  }
  if (known.path !== path || known.bodyHash !== bodyHash) {
    throw new ApiError(400, {
      type: 'idempotency_error',
      message:
        'Keys for idempotent requests can only be used with the same endpoint and the same parameters they ' +
        `were first used with. Try using a key other than '${key}' if you meant a different request.`,
    });
  }
  if (!known.answer) {
    throw new ApiError(409, {
      type: 'idempotency_error',
      code: 'idempotency_key_in_use',
      message: `Another request with the idempotency key '${key}' is still in progress. Try again later.`,
    });
  }
  return { replay: known };
}

/** Keeps the answer, or frees the key where nothing was begun. */
export function settleKey(
  standIn: StandIn,
  claim: IdempotentAnswer,
  answer: { status: number; json: string; isRemembered: boolean },
): void {
  if (answer.isRemembered) claim.answer = { status: answer.status, json: answer.json };
  else standIn.state.idempotentAnswers.remove(claim.id);
}
