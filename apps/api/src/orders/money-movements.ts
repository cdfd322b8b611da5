/**
 * Money that came and went for orders, as a query for the ledger to list beside the movements of other rooms. Its
 * columns, in this order: id, kind, at, amountMinor (below zero where it leaves), currency, state, orderId, subject,
 * email, intentId and serviceId (the payment and the refund or dispute, as the payment service calls them).
 *
 * A refund moves money when it is settled, and once more when the buyer's bank sends it back. A dispute takes the
 * money when it is opened and gives it back when it is won; an inquiry takes none. The loss of a dispute is kept as a
 * refund too, for its credit note, but no money moves with it.
 */
export const ORDER_MOVEMENTS = `
  SELECT o.id, 'payment' AS kind, o.paid_at AS at, CAST(o.total_minor AS SIGNED) AS amountMinor, o.currency, o.state,
         o.id AS orderId, o.number AS subject, o.email, o.payment_intent_id AS intentId, NULL AS serviceId
  FROM orders o WHERE o.paid_at IS NOT NULL AND o.total_minor > 0
  UNION ALL
  SELECT r.id, 'refund', COALESCE(r.settled_at, r.created_at), -CAST(r.amount_minor AS SIGNED), r.currency, r.state,
         o.id, o.number, o.email, o.payment_intent_id, r.service_id
  FROM refunds r JOIN orders o ON o.id = r.order_id WHERE r.origin <> 'dispute'
  UNION ALL
  SELECT CONCAT(r.id, ':back'), 'refund-back', r.updated_at, CAST(r.amount_minor AS SIGNED), r.currency, r.state,
         o.id, o.number, o.email, o.payment_intent_id, r.service_id
  FROM refunds r JOIN orders o ON o.id = r.order_id WHERE r.origin <> 'dispute' AND r.state = 'returned'
  UNION ALL
  SELECT d.id, 'dispute', d.opened_at, IF(d.state IN ('inquiry', 'closed'), 0, -CAST(d.amount_minor AS SIGNED)),
         d.currency, d.state, o.id, o.number, o.email, o.payment_intent_id, d.service_id
  FROM disputes d JOIN orders o ON o.id = d.order_id
  UNION ALL
  SELECT CONCAT(d.id, ':back'), 'dispute-back', COALESCE(d.closed_at, d.updated_at), CAST(d.amount_minor AS SIGNED),
         d.currency, d.state, o.id, o.number, o.email, o.payment_intent_id, d.service_id
  FROM disputes d JOIN orders o ON o.id = d.order_id WHERE d.state = 'won'`;
