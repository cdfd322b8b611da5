/**
 * Money that came in for pledges, as a query for the ledger to list beside the movements of other rooms. Its columns,
 * in this order: id, kind, at, amountMinor, currency, state, orderId, subject, email, intentId and serviceId.
 */
export const PLEDGE_MOVEMENTS = `
  SELECT m.id, 'pledge' AS kind, m.paid_at AS at, CAST(m.amount_minor AS SIGNED) AS amountMinor, m.currency,
         'paid' AS state, NULL AS orderId, p.number AS subject, COALESCE(n.email, '') AS email,
         m.payment_intent_id AS intentId, m.invoice_id AS serviceId
  FROM pledge_payments m JOIN pledges p ON p.id = m.pledge_id LEFT JOIN people n ON n.id = p.person_id`;
