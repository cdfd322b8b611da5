import { inOrder } from './statements.js';

/** The outbox: jobs written in the transaction that causes them, and the e-mails they send. */
export const up = inOrder(
  `CREATE TABLE jobs (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    name VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    payload JSON NOT NULL,
    dedupe_key VARCHAR(190) CHARACTER SET ascii COLLATE ascii_bin NULL,
    state ENUM('queued','running','done','dead') NOT NULL DEFAULT 'queued',
    run_at DATETIME(6) NOT NULL,
    attempts INT UNSIGNED NOT NULL DEFAULT 0,
    leased_until DATETIME(6) NULL,
    leased_by VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NULL,
    last_error TEXT NULL,
    created_at DATETIME(6) NOT NULL,
    finished_at DATETIME(6) NULL,
    UNIQUE KEY jobs_dedupe (dedupe_key),
    KEY jobs_claim (state, run_at, id),
    KEY jobs_lease (state, leased_until)
  )`,
  `CREATE TABLE mails (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    template VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    to_address VARCHAR(254) NOT NULL,
    message JSON NOT NULL,
    dedupe_key VARCHAR(190) CHARACTER SET ascii COLLATE ascii_bin NULL,
    about VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NULL,
    subject VARCHAR(250) NULL,
    state ENUM('queued','handed-over','sent','refused') NOT NULL DEFAULT 'queued',
    last_error TEXT NULL,
    created_at DATETIME(6) NOT NULL,
    sent_at DATETIME(6) NULL,
    UNIQUE KEY mails_dedupe (dedupe_key),
    KEY mails_about (about)
  )`,
);
