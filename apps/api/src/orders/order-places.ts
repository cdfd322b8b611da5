/**
 * What is known of where the buyers of paid orders are, as a query for the ledger to list beside the places of other
 * rooms. Its columns, in this order: subjectId, paidAt, declared, billing, card, isUnclear.
 */
export const ORDER_PLACES = `
  SELECT id AS subjectId, paid_at AS paidAt, declared_country AS declared, payment_country AS billing,
         card_country AS card, JSON_CONTAINS(flags, '"location-unclear"') AS isUnclear
  FROM orders WHERE paid_at IS NOT NULL`;
