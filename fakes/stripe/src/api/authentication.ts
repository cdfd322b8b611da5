import { ApiError } from './errors.js';

/** @throws ApiError 401 unless the header carries the one key that is let in */
export function checkApiKey(authorization: string | undefined, apiKey: string): void {
  const given = /^Bearer (.+)$/.exec(authorization ?? '')?.[1];
  if (given === apiKey) return;
  const message = given
    ? `Invalid API Key provided: ${masked(given)}`
    : "You did not provide an API key. Send it in the Authorization header, as 'Bearer YOUR_SECRET_KEY'.";
  throw new ApiError(401, { type: 'invalid_request_error', message });
}

/** The ends of the key alone: an answer must not repeat a secret. */
function masked(key: string): string {
  return key.length <= 12
    ? '*'.repeat(key.length)
    : `${key.slice(0, 8)}${'*'.repeat(key.length - 12)}${key.slice(-4)}`;
}
