import type Stripe from 'stripe';
import type { Cause, StandIn } from '../stand-in.js';
import type { Buyer } from '../state/records.js';
import type { SessionDetail } from '../state/state.js';
import type { Card } from './cards.js';

/** How one try of the buyer ended. */
export type PayResult =
  { kind: 'complete' } | { kind: 'second-step' } | { kind: 'declined'; message: string };

/** What a page is about, and who sits at it with which card. */
export type Visit = {
  standIn: StandIn;
  session: Stripe.Checkout.Session;
  detail: SessionDetail;
  card: Card;
  buyer: Buyer;
};

/** What one mode of a checkout session does. */
export type PageFlow = {
  /** Readies what is to be paid, or the card to be kept; says whether the bank asks first. */
  start(visit: Visit): 'second-step' | 'ready';
  /** Takes the money, or keeps the card. Returns the sentence to show where that failed, else null. */
  finish(visit: Visit, isAuthenticated: boolean): string | null;
  /** The second step was refused. Returns the sentence to show. */
  refuse(visit: Visit): string;
  /** The page ends without having been used. */
  drop(standIn: StandIn, session: Stripe.Checkout.Session, detail: SessionDetail, cause: Cause): void;
};

export const pageUrl = (standIn: StandIn, session: Stripe.Checkout.Session): string =>
  `${standIn.settings.publicUrl}/pay/${session.id}`;

/** The customer of a page, by id. */
export const customerOf = (session: Stripe.Checkout.Session): string | null =>
  typeof session.customer === 'string' ? session.customer : null;
