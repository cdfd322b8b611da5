import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/**
 * Letters, their readers frozen when sending starts, who asked for news and for mails about revisions, and
 * the addresses that mail servers say are dead.
 */
export const up = inOrder(
  `CREATE TABLE letters (
    id ${ID} NOT NULL PRIMARY KEY,
    kind ENUM('service','news') NOT NULL,
    subject VARCHAR(150) NOT NULL,
    body MEDIUMTEXT NOT NULL,
    kit_id ${ID} NULL,
    revision_id ${ID} NULL,
    audience JSON NOT NULL,
    leaves_out_unneeded BOOLEAN NOT NULL DEFAULT TRUE,
    per_minute INT UNSIGNED NOT NULL,
    state ENUM('draft','scheduled','sending','paused','cancelled','sent') NOT NULL DEFAULT 'draft',
    slug VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NULL,
    run INT UNSIGNED NOT NULL DEFAULT 0,
    send_at DATETIME(6) NULL,
    paced_until DATETIME(6) NULL,
    started_at DATETIME(6) NULL,
    finished_at DATETIME(6) NULL,
    written_by ${ID} NOT NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY letters_slug (slug),
    KEY letters_state (state, updated_at),
    KEY letters_archive (kind, state, started_at),
    CONSTRAINT letters_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id),
    CONSTRAINT letters_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id)
  )`,
  `CREATE TABLE letter_recipients (
    id ${ID} NOT NULL PRIMARY KEY,
    letter_id ${ID} NOT NULL,
    person_id ${ID} NULL,
    email VARCHAR(254) NOT NULL,
    name VARCHAR(80) NOT NULL DEFAULT '',
    held_revision_id ${ID} NULL,
    link_id ${ID} NULL,
    state ENUM('queued','handed-over','sent','refused','bounced','left-out') NOT NULL,
    reason VARCHAR(500) NULL,
    tries INT UNSIGNED NOT NULL DEFAULT 0,
    due_at DATETIME(6) NOT NULL,
    leased_by VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NULL,
    sent_at DATETIME(6) NULL,
    UNIQUE KEY letter_recipients_email (letter_id, email),
    UNIQUE KEY letter_recipients_person (letter_id, person_id),
    KEY letter_recipients_claim (letter_id, state, due_at, id),
    KEY letter_recipients_lease (leased_by),
    KEY letter_recipients_reader (person_id, state, sent_at),
    CONSTRAINT letter_recipients_letter_fk FOREIGN KEY (letter_id) REFERENCES letters (id)
  )`,
  `CREATE TABLE news_readers (
    id ${ID} NOT NULL PRIMARY KEY,
    email VARCHAR(254) NOT NULL,
    state ENUM('asked','confirmed','stopped') NOT NULL,
    confirm_hash ${SHA} NULL,
    confirm_until DATETIME(6) NULL,
    stop_hash ${SHA} NOT NULL,
    asked_at DATETIME(6) NOT NULL,
    confirmed_at DATETIME(6) NULL,
    stopped_at DATETIME(6) NULL,
    UNIQUE KEY news_readers_email (email),
    UNIQUE KEY news_readers_stop (stop_hash),
    UNIQUE KEY news_readers_confirm (confirm_hash),
    KEY news_readers_state (state, email)
  )`,
  `CREATE TABLE revision_watchers (
    id ${ID} NOT NULL PRIMARY KEY,
    person_id ${ID} NOT NULL,
    kit_id ${ID} NOT NULL,
    is_on BOOLEAN NOT NULL,
    stop_hash ${SHA} NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY revision_watchers_pair (person_id, kit_id),
    UNIQUE KEY revision_watchers_stop (stop_hash),
    KEY revision_watchers_kit (kit_id, is_on, id),
    CONSTRAINT revision_watchers_person_fk FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE CASCADE,
    CONSTRAINT revision_watchers_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id)
  )`,
  `CREATE TABLE dead_addresses (
    id ${ID} NOT NULL PRIMARY KEY,
    email VARCHAR(254) NOT NULL,
    reason VARCHAR(500) NOT NULL,
    letter_id ${ID} NULL,
    since DATETIME(6) NOT NULL,
    UNIQUE KEY dead_addresses_email (email),
    KEY dead_addresses_since (since, id)
  )`,
);
