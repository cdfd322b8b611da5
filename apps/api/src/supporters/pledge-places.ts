/**
 * What was known of where supporters are when they paid a month, as a query for the ledger to list beside the places
 * of other rooms. Its columns, in this order: subjectId (the payment), paidAt, declared, billing, card, isUnclear.
 */
export const PLEDGE_PLACES = `
  SELECT m.id AS subjectId, m.paid_at AS paidAt, p.declared_country AS declared, m.billing_country AS billing,
         m.card_country AS card, m.is_unclear AS isUnclear
  FROM pledge_payments m JOIN pledges p ON p.id = m.pledge_id`;
