import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SERVICE_ID = 'VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin';
const COUNTRY = 'CHAR(2) CHARACTER SET ascii';
const CURRENCY = 'CHAR(3) CHARACTER SET ascii';
const KEEPS = `ENUM('nothing','released-during','released-before-end')`;

/** Pledge plans, pledges with their payments and history; receipts and entitlements that come from them. */
export const up = inOrder(
  `CREATE TABLE pledge_plans (
    id ${ID} NOT NULL PRIMARY KEY,
    name VARCHAR(60) NOT NULL,
    words TEXT NOT NULL,
    amount_minor INT UNSIGNED NOT NULL,
    currency ${CURRENCY} NOT NULL,
    has_all_kits BOOLEAN NOT NULL DEFAULT FALSE,
    keeps_after ${KEEPS} NOT NULL,
    is_offered BOOLEAN NOT NULL DEFAULT TRUE,
    kits_version INT UNSIGNED NOT NULL DEFAULT 1,
    followed_version INT UNSIGNED NOT NULL DEFAULT 1,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY pledge_plans_name (name),
    KEY pledge_plans_offered (is_offered, amount_minor)
  )`,
  `CREATE TABLE pledge_plan_kits (
    plan_id ${ID} NOT NULL,
    kit_id ${ID} NOT NULL,
    PRIMARY KEY (plan_id, kit_id),
    CONSTRAINT pledge_plan_kits_plan_fk FOREIGN KEY (plan_id) REFERENCES pledge_plans (id) ON DELETE CASCADE,
    CONSTRAINT pledge_plan_kits_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id)
  )`,
  // `live_person_id` lets a person have one pledge that is open or under way, and any number that are over. Without
  // RTRIM the database refuses it: how a CHAR column reads depends on a session's mode.
  // A wish is written down before the payment service hears of it and stays until the service agrees.
  // `looks` counts the times the payment service was asked, `followed_look` is the last of them that was followed.
  `CREATE TABLE pledges (
    id ${ID} NOT NULL PRIMARY KEY,
    person_id ${ID} NOT NULL,
    plan_id ${ID} NOT NULL,
    amount_minor INT UNSIGNED NOT NULL,
    currency ${CURRENCY} NOT NULL,
    keeps_after ${KEEPS} NOT NULL,
    next_plan_id ${ID} NULL,
    next_amount_minor INT UNSIGNED NULL,
    next_keeps_after ${KEEPS} NULL,
    next_plan_from DATETIME(6) NULL,
    state VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'opening',
    live_person_id ${ID} AS (CASE WHEN state = 'lapsed' OR state = 'ended' THEN NULL ELSE RTRIM(person_id) END) STORED,
    attempt ${ID} NOT NULL,
    declared_country ${COUNTRY} NOT NULL,
    payment_country ${COUNTRY} NULL,
    card_country ${COUNTRY} NULL,
    card_last4 CHAR(4) CHARACTER SET ascii NULL,
    flags JSON NOT NULL,
    consent_text TEXT NOT NULL,
    consent_at DATETIME(6) NOT NULL,
    session_id ${SERVICE_ID} NULL,
    payment_url TEXT NULL,
    pay_until DATETIME(6) NULL,
    customer_id ${SERVICE_ID} NULL,
    subscription_id ${SERVICE_ID} NULL,
    began_at DATETIME(6) NULL,
    paid_until DATETIME(6) NULL,
    period_end DATETIME(6) NULL,
    next_payment_at DATETIME(6) NULL,
    ends_at DATETIME(6) NULL,
    paused_until DATETIME(6) NULL,
    failed_invoice_id ${SERVICE_ID} NULL,
    failing_since DATETIME(6) NULL,
    grace_until DATETIME(6) NULL,
    settle_url TEXT NULL,
    end_wish ENUM('end','keep') NULL,
    pause_wish ENUM('pause','resume') NULL,
    amount_wish INT UNSIGNED NULL,
    card_page_id ${SERVICE_ID} NULL,
    rights_until DATETIME(6) NULL,
    ended_at DATETIME(6) NULL,
    looks INT UNSIGNED NOT NULL DEFAULT 0,
    followed_look INT UNSIGNED NOT NULL DEFAULT 0,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY pledges_attempt (attempt),
    UNIQUE KEY pledges_live_person (live_person_id),
    UNIQUE KEY pledges_session (session_id),
    UNIQUE KEY pledges_subscription (subscription_id),
    KEY pledges_person (person_id, created_at),
    KEY pledges_state (state, created_at),
    KEY pledges_plan (plan_id, state),
    KEY pledges_created (created_at, id),
    CONSTRAINT pledges_plan_fk FOREIGN KEY (plan_id) REFERENCES pledge_plans (id)
  )`,
  `CREATE TABLE pledge_payments (
    id ${ID} NOT NULL PRIMARY KEY,
    pledge_id ${ID} NOT NULL,
    plan_id ${ID} NOT NULL,
    invoice_id ${SERVICE_ID} NOT NULL,
    payment_intent_id ${SERVICE_ID} NULL,
    amount_minor INT UNSIGNED NOT NULL,
    currency ${CURRENCY} NOT NULL,
    country ${COUNTRY} NOT NULL,
    period_start DATETIME(6) NOT NULL,
    period_end DATETIME(6) NOT NULL,
    paid_at DATETIME(6) NOT NULL,
    receipt_number VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin NULL,
    tax JSON NULL,
    dispute_state VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
    created_at DATETIME(6) NOT NULL,
    UNIQUE KEY pledge_payments_invoice (invoice_id),
    KEY pledge_payments_pledge (pledge_id, period_start),
    KEY pledge_payments_intent (payment_intent_id),
    KEY pledge_payments_paid (paid_at),
    CONSTRAINT pledge_payments_pledge_fk FOREIGN KEY (pledge_id) REFERENCES pledges (id)
  )`,
  `CREATE TABLE pledge_history (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    pledge_id ${ID} NOT NULL,
    at DATETIME(6) NOT NULL,
    what VARCHAR(60) NOT NULL,
    detail VARCHAR(500) NOT NULL DEFAULT '',
    KEY pledge_history_pledge (pledge_id, id),
    CONSTRAINT pledge_history_pledge_fk FOREIGN KEY (pledge_id) REFERENCES pledges (id)
  )`,
  // A receipt is of an order or of one payment of a pledge.
  `ALTER TABLE receipts MODIFY COLUMN order_id ${ID} NULL,
    ADD COLUMN pledge_payment_id ${ID} NULL AFTER order_id,
    ADD UNIQUE KEY receipts_pledge_payment (pledge_payment_id),
    ADD CONSTRAINT receipts_pledge_payment_fk FOREIGN KEY (pledge_payment_id) REFERENCES pledge_payments (id)`,
  // Bounds by the moment of release; `until_at` says how far the pledge behind it is paid.
  `ALTER TABLE entitlements
    ADD COLUMN pledge_id ${ID} NULL AFTER order_line_id,
    ADD COLUMN released_from DATETIME(6) NULL,
    ADD COLUMN released_before DATETIME(6) NULL,
    ADD COLUMN until_at DATETIME(6) NULL,
    ADD UNIQUE KEY entitlements_pledge_kit (pledge_id, kit_id)`,
  // The handling of payment events belongs to no single room any more.
  `UPDATE jobs SET name = 'payments.handle-event' WHERE name = 'orders.handle-payment-event'`,
);
