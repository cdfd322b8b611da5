import Stripe from 'stripe';
import type { Config } from '../../config/config.js';
import { CardDeclined, PaymentsRefused, PaymentsUnreachable } from './payment-faults.js';

/** The official SDK; host, port and key are settings. */
export const openStripe = (config: Config): Stripe =>
  new Stripe(config.STRIPE_KEY, {
    protocol: config.STRIPE_PROTOCOL,
    ...(config.STRIPE_HOST ? { host: config.STRIPE_HOST } : {}),
    ...(config.STRIPE_PORT ? { port: config.STRIPE_PORT } : {}),
    telemetry: false,
    timeout: 15_000,
    maxNetworkRetries: 2,
  });

/** Turns the SDK's errors into the three that the shop tells apart. */
export const calling = async <T>(request: Promise<T>): Promise<T> => {
  try {
    return await request;
  } catch (fault) {
    if (fault instanceof Stripe.errors.StripeCardError) throw new CardDeclined(fault.message);
    if (fault instanceof Stripe.errors.StripeInvalidRequestError) throw new PaymentsRefused(fault.message);
    // The key was used for another request: that stays so. One still under way (409) does not.
    if (fault instanceof Stripe.errors.StripeIdempotencyError && fault.statusCode === 400)
      throw new PaymentsRefused(fault.message);
    if (fault instanceof Stripe.errors.StripeError) throw new PaymentsUnreachable(fault.message);
    throw fault;
  }
};

/** The service gives a reference as an id, or as the object where it was asked to. */
export const idOf = (reference: string | { id: string } | null | undefined): string | null =>
  typeof reference === 'string' ? reference : (reference?.id ?? null);

/** The object where it was asked for and is not deleted. */
export const objectOf = <T extends { id: string; deleted?: boolean | void }>(
  reference: string | T | { id: string; deleted: true } | null | undefined,
): T | null =>
  typeof reference === 'object' && reference !== null && !reference.deleted ? (reference as T) : null;

export const dateOf = (seconds: number): Date => new Date(seconds * 1000);
export const dateOrNull = (seconds: number | null | undefined): Date | null =>
  seconds === null || seconds === undefined ? null : dateOf(seconds);
export const secondsOf = (date: Date): number => Math.ceil(date.getTime() / 1000);
