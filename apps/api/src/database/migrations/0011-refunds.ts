import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SERVICE_ID = 'VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin';

/** Refunds by line, disputes with their history, credit notes, and all that a receipt needs to be printed. */
export const up = inOrder(
  `ALTER TABLE orders
    ADD COLUMN refunded_minor INT UNSIGNED NOT NULL DEFAULT 0,
    ADD KEY orders_refunded (refunded_minor),
    ADD CONSTRAINT orders_give_back_no_more_than_paid CHECK (refunded_minor <= total_minor)`,
  `ALTER TABLE order_lines
    ADD COLUMN refunded_minor INT UNSIGNED NOT NULL DEFAULT 0,
    ADD CONSTRAINT order_lines_give_back_no_more_than_paid CHECK (refunded_minor <= total_minor)`,
  // `service`: begun at the payment service; `dispute`: the loss of one. `returned`: the bank sent it back.
  `CREATE TABLE refunds (
    id ${ID} NOT NULL PRIMARY KEY,
    order_id ${ID} NOT NULL,
    attempt ${ID} NULL,
    origin ENUM('workshop','service','dispute') NOT NULL,
    state ENUM('asked','succeeded','failed','returned') NOT NULL,
    amount_minor INT UNSIGNED NOT NULL,
    currency CHAR(3) CHARACTER SET ascii NOT NULL,
    reason VARCHAR(300) NOT NULL DEFAULT '',
    asked_by VARCHAR(200) NULL,
    service_id ${SERVICE_ID} NULL,
    fault VARCHAR(500) NULL,
    credit_note_id ${ID} NULL,
    credit_note_number VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    settled_at DATETIME(6) NULL,
    UNIQUE KEY refunds_attempt (attempt),
    UNIQUE KEY refunds_service (service_id),
    KEY refunds_order (order_id, created_at),
    CONSTRAINT refunds_order_fk FOREIGN KEY (order_id) REFERENCES orders (id)
  )`,
  `CREATE TABLE refund_lines (
    refund_id ${ID} NOT NULL,
    order_line_id ${ID} NOT NULL,
    amount_minor INT UNSIGNED NOT NULL,
    keeps_entitlement BOOLEAN NOT NULL,
    PRIMARY KEY (refund_id, order_line_id),
    KEY refund_lines_line (order_line_id),
    CONSTRAINT refund_lines_refund_fk FOREIGN KEY (refund_id) REFERENCES refunds (id),
    CONSTRAINT refund_lines_line_fk FOREIGN KEY (order_line_id) REFERENCES order_lines (id)
  )`,
  `CREATE TABLE disputes (
    id ${ID} NOT NULL PRIMARY KEY,
    order_id ${ID} NOT NULL,
    service_id ${SERVICE_ID} NOT NULL,
    state ENUM('inquiry','open','won','lost','closed') NOT NULL,
    amount_minor INT UNSIGNED NOT NULL,
    currency CHAR(3) CHARACTER SET ascii NOT NULL,
    reason VARCHAR(80) NOT NULL DEFAULT '',
    answer_by DATETIME(6) NULL,
    opened_at DATETIME(6) NOT NULL,
    closed_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY disputes_service (service_id),
    KEY disputes_order (order_id, opened_at),
    CONSTRAINT disputes_order_fk FOREIGN KEY (order_id) REFERENCES orders (id)
  )`,
  `CREATE TABLE dispute_history (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    dispute_id ${ID} NOT NULL,
    at DATETIME(6) NOT NULL,
    state ENUM('inquiry','open','won','lost','closed') NOT NULL,
    detail VARCHAR(300) NOT NULL DEFAULT '',
    KEY dispute_history_dispute (dispute_id, id),
    CONSTRAINT dispute_history_dispute_fk FOREIGN KEY (dispute_id) REFERENCES disputes (id)
  )`,
  // A receipt is what it was when it was issued: who sold, who bought and what is written into it.
  `ALTER TABLE receipts
    ADD COLUMN order_number VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
    ADD COLUMN buyer JSON NULL,
    ADD COLUMN seller JSON NULL,
    ADD COLUMN \`lines\` JSON NULL,
    ADD KEY receipts_issued (issued_at, id)`,
  `UPDATE receipts r JOIN orders o ON o.id = r.order_id SET
    r.order_number = o.number,
    r.buyer = JSON_OBJECT('email', o.email, 'country', r.country),
    r.\`lines\` = (
      SELECT JSON_ARRAYAGG(JSON_OBJECT('orderLineId', l.id, 'kit', l.kit_name, 'licence', l.licence_name,
        'revision', l.revision_label, 'priceMinor', l.price_minor, 'discountMinor', l.discount_minor,
        'totalMinor', l.total_minor, 'ratePercent', JSON_VALUE(r.tax, '$[0].ratePercent')) ORDER BY l.position)
      FROM order_lines l WHERE l.order_id = o.id)`,
  `ALTER TABLE receipts
    MODIFY COLUMN order_number VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    MODIFY COLUMN buyer JSON NOT NULL,
    MODIFY COLUMN \`lines\` JSON NOT NULL`,
  `CREATE TABLE credit_notes (
    id ${ID} NOT NULL PRIMARY KEY,
    refund_id ${ID} NOT NULL,
    order_id ${ID} NOT NULL,
    receipt_id ${ID} NOT NULL,
    order_number VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    series VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    year SMALLINT UNSIGNED NOT NULL,
    number INT UNSIGNED NOT NULL,
    label VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    currency CHAR(3) CHARACTER SET ascii NOT NULL,
    total_minor INT UNSIGNED NOT NULL,
    country CHAR(2) CHARACTER SET ascii NOT NULL,
    tax JSON NOT NULL,
    \`lines\` JSON NOT NULL,
    cause ENUM('refund','dispute') NOT NULL,
    issued_at DATETIME(6) NOT NULL,
    UNIQUE KEY credit_notes_refund (refund_id),
    UNIQUE KEY credit_notes_number (series, year, number),
    KEY credit_notes_order (order_id),
    KEY credit_notes_issued (issued_at, id),
    CONSTRAINT credit_notes_receipt_fk FOREIGN KEY (receipt_id) REFERENCES receipts (id)
  )`,
);
