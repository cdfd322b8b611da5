import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const COUNTRY = 'CHAR(2) CHARACTER SET ascii';
const CURRENCY = 'CHAR(3) CHARACTER SET ascii';
const RATE_COUNTRY = 'CHAR(2) CHARACTER SET ascii COLLATE ascii_bin';
const RATE_KIND = 'VARCHAR(30) CHARACTER SET ascii COLLATE ascii_bin';
const TREATMENT = `ENUM('consumer','domestic-business','reverse-charge','business-abroad')`;
const WORK_STATE = `ENUM('waiting','running','done','failed')`;

/** Business buyers and how a sale is taxed; rates with their history; quarters, exports and reconciliations. */
export const up = inOrder(
  `ALTER TABLE orders
    ADD COLUMN tax_treatment ${TREATMENT} NOT NULL DEFAULT 'consumer' AFTER tax,
    ADD COLUMN business JSON NULL AFTER tax_treatment,
    ADD COLUMN settled_country ${COUNTRY} NULL AFTER card_country`,
  `ALTER TABLE receipts ADD COLUMN tax_treatment ${TREATMENT} NOT NULL DEFAULT 'consumer' AFTER country`,
  // What a rate was before somebody changed it; a null rate is one that was not there.
  `CREATE TABLE tax_rate_changes (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    country ${RATE_COUNTRY} NOT NULL,
    product_kind ${RATE_KIND} NOT NULL,
    valid_from DATE NOT NULL,
    rate_before DECIMAL(6,3) NULL,
    rate_after DECIMAL(6,3) NULL,
    source VARCHAR(200) NOT NULL,
    who VARCHAR(200) NOT NULL,
    at DATETIME(6) NOT NULL,
    KEY tax_rate_changes_country (country, id)
  )`,
  // A receipt stays as it was issued; where it was counted in a country nobody was sure of, this says which.
  `CREATE TABLE tax_settlements (
    receipt_id ${ID} NOT NULL PRIMARY KEY,
    country ${COUNTRY} NOT NULL,
    tax_treatment ${TREATMENT} NOT NULL,
    rate_percent VARCHAR(8) CHARACTER SET ascii NOT NULL,
    net_minor INT UNSIGNED NOT NULL,
    tax_minor INT UNSIGNED NOT NULL,
    reason VARCHAR(500) NOT NULL,
    who VARCHAR(200) NOT NULL,
    at DATETIME(6) NOT NULL,
    KEY tax_settlements_at (at, receipt_id),
    CONSTRAINT tax_settlements_receipt_fk FOREIGN KEY (receipt_id) REFERENCES receipts (id)
  )`,
  `CREATE TABLE tax_quarters (
    year SMALLINT UNSIGNED NOT NULL,
    quarter TINYINT UNSIGNED NOT NULL,
    closed_at DATETIME(6) NULL,
    closed_by VARCHAR(200) NULL,
    figures JSON NULL,
    PRIMARY KEY (year, quarter),
    CONSTRAINT tax_quarters_are_four CHECK (quarter BETWEEN 1 AND 4)
  )`,
  `CREATE TABLE ledger_exports (
    id ${ID} NOT NULL PRIMARY KEY,
    year SMALLINT UNSIGNED NOT NULL,
    state ${WORK_STATE} NOT NULL DEFAULT 'waiting',
    percent TINYINT UNSIGNED NOT NULL DEFAULT 0,
    storage_key VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NULL,
    sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    bytes BIGINT UNSIGNED NULL,
    fault VARCHAR(500) NULL,
    asked_by VARCHAR(200) NOT NULL,
    created_at DATETIME(6) NOT NULL,
    finished_at DATETIME(6) NULL,
    KEY ledger_exports_created (created_at, id)
  )`,
  `CREATE TABLE reconciliations (
    id ${ID} NOT NULL PRIMARY KEY,
    from_day DATE NOT NULL,
    to_day DATE NOT NULL,
    state ${WORK_STATE} NOT NULL DEFAULT 'waiting',
    percent TINYINT UNSIGNED NOT NULL DEFAULT 0,
    sums JSON NULL,
    differences INT UNSIGNED NULL,
    fault VARCHAR(500) NULL,
    asked_by VARCHAR(200) NOT NULL,
    created_at DATETIME(6) NOT NULL,
    finished_at DATETIME(6) NULL,
    KEY reconciliations_created (created_at, id)
  )`,
  `CREATE TABLE reconciliation_rows (
    reconciliation_id ${ID} NOT NULL,
    position INT UNSIGNED NOT NULL,
    kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    verdict VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    occurred_at DATETIME(6) NOT NULL,
    currency ${CURRENCY} NOT NULL,
    here_minor INT NULL,
    there_minor INT NULL,
    fee_minor INT NULL,
    service_id VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NULL,
    payment_intent_id VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NULL,
    order_id ${ID} NULL,
    subject VARCHAR(60) NULL,
    PRIMARY KEY (reconciliation_id, position),
    KEY reconciliation_rows_verdict (reconciliation_id, verdict, position),
    CONSTRAINT reconciliation_rows_fk FOREIGN KEY (reconciliation_id) REFERENCES reconciliations (id) ON DELETE CASCADE
  )`,
);
