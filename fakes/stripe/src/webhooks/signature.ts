import { createHmac } from 'node:crypto';

/**
 * The `Stripe-Signature` header: the HMAC-SHA256 of `<timestamp>.<body>` under the endpoint's secret.
 * `timestampSeconds` is real time: the receiver compares it with its own clock.
 */
export function signatureHeader(body: string, secret: string, timestampSeconds: number): string {
  const signature = createHmac('sha256', secret).update(`${timestampSeconds}.${body}`, 'utf8').digest('hex');
  return `t=${timestampSeconds},v1=${signature}`;
}
