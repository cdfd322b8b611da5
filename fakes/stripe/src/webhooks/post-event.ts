import type Stripe from 'stripe';
import type { Settings } from '../options.js';
import { signatureHeader } from './signature.js';

export type EndpointAnswer = { isTaken: boolean; status: number | null; fault: string | null };

/** Posts one event, signed afresh. Only a status from 200 to 299 counts as taken; a redirect does not. */
export async function postEvent(
  event: Stripe.Event,
  url: string,
  settings: Pick<Settings, 'webhookSecret' | 'webhookTimeoutMs'>,
  stopping: AbortSignal,
): Promise<EndpointAnswer> {
  // Spread over lines, as the service sends it: a receiver that checks the signature over JSON it has
  // parsed and written again, instead of over the bytes, fails here as it would there.
  const body = JSON.stringify(event, null, 2);
  const timestampSeconds = Math.floor(Date.now() / 1000);
  try {
    const response = await fetch(url, {
      method: 'POST',
      body,
      headers: {
        'content-type': 'application/json; charset=utf-8',
        'stripe-signature': signatureHeader(body, settings.webhookSecret, timestampSeconds),
        'user-agent': 'windchest-fake-stripe',
      },
      redirect: 'manual',
      signal: AbortSignal.any([stopping, AbortSignal.timeout(settings.webhookTimeoutMs)]),
    });
    await response.arrayBuffer();
    const fault = response.ok ? null : `the endpoint answered ${response.status}`;
    return { isTaken: response.ok, status: response.status, fault };
  } catch (error) {
    return { isTaken: false, status: null, fault: faultOf(error) };
  }
}

function faultOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  if (error.name === 'TimeoutError') return 'the endpoint did not answer in time';
  const cause = error.cause as { code?: string } | undefined;
  return cause?.code ? `${error.message} (${cause.code})` : error.message;
}
