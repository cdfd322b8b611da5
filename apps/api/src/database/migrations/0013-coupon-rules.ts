import { inOrder } from './statements.js';

/** Coupons for supporters only and from a smallest basket on; places are found by account and by day. */
export const up = inOrder(
  `ALTER TABLE coupons
    ADD COLUMN is_for_supporters BOOLEAN NOT NULL DEFAULT FALSE AFTER per_buyer,
    ADD COLUMN min_basket_minor INT UNSIGNED NULL AFTER is_for_supporters`,
  `ALTER TABLE coupon_places
    ADD KEY coupon_places_person (coupon_id, person_id, state),
    ADD KEY coupon_places_taken (coupon_id, created_at)`,
  `ALTER TABLE orders ADD KEY orders_coupon (coupon_id, created_at)`,
);
