import type Stripe from 'stripe';
import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';

export function emptyEvidence(): Stripe.Dispute.Evidence {
  return {
    access_activity_log: null,
    billing_address: null,
    cancellation_policy: null,
    cancellation_policy_disclosure: null,
    cancellation_rebuttal: null,
    customer_communication: null,
    customer_email_address: null,
    customer_name: null,
    customer_purchase_ip: null,
    customer_signature: null,
    duplicate_charge_documentation: null,
    duplicate_charge_explanation: null,
    duplicate_charge_id: null,
    enhanced_evidence: {},
    product_description: null,
    receipt: null,
    refund_policy: null,
    refund_policy_disclosure: null,
    refund_refusal_explanation: null,
    service_date: null,
    service_documentation: null,
    shipping_address: null,
    shipping_carrier: null,
    shipping_date: null,
    shipping_documentation: null,
    shipping_tracking_number: null,
    uncategorized_file: null,
    uncategorized_text: null,
  };
}

// What is written as text. Files would have to be uploaded first, and the stand-in keeps none.
const texts = [
  'access_activity_log', 'billing_address', 'cancellation_policy_disclosure', 'cancellation_rebuttal',
  'customer_email_address', 'customer_name', 'customer_purchase_ip', 'duplicate_charge_explanation',
  'duplicate_charge_id', 'product_description', 'refund_policy_disclosure', 'refund_refusal_explanation',
  'service_date', 'shipping_address', 'shipping_carrier', 'shipping_date', 'shipping_tracking_number',
  'uncategorized_text',
] as const; // prettier-ignore

/** Writes what is given into the evidence. Returns whether there was anything. */
export function readEvidence(evidence: Stripe.Dispute.Evidence, fields: Fields | null): boolean {
  if (!fields) return false;
  fields.allowOnly(...texts);
  const given = texts.filter((key) => fields.has(key));
  for (const key of given) {
    const text = fields.requiredString(key);
    if (text.length > 20_000)
      throw badParameter(fields.nameOf(key), 'Evidence has at most 20,000 characters a field.');
    evidence[key] = text;
  }
  return given.length > 0;
}
