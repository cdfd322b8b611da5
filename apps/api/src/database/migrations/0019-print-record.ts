import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/**
 * What people printed, part by part, and bundles of what is to print again: made on demand, one for all who
 * need the same, thrown away when nobody has fetched them for long.
 */
export const up = inOrder(
  `CREATE TABLE print_records (
    id ${ID} NOT NULL PRIMARY KEY,
    person_id ${ID} NOT NULL,
    kit_id ${ID} NOT NULL,
    part_code VARCHAR(10) NOT NULL,
    revision_id ${ID} NOT NULL,
    clearance ENUM('minus','zero','plus') NOT NULL,
    quantity INT UNSIGNED NOT NULL,
    geometry_hash VARCHAR(128) CHARACTER SET ascii COLLATE ascii_bin NULL,
    at DATETIME(6) NOT NULL,
    UNIQUE KEY print_records_one (person_id, kit_id, part_code, revision_id, clearance),
    KEY print_records_kit (kit_id, person_id),
    CONSTRAINT print_records_person_fk FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE CASCADE,
    CONSTRAINT print_records_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id),
    CONSTRAINT print_records_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id)
  )`,
  `CREATE TABLE changed_bundles (
    need_hash ${SHA} NOT NULL PRIMARY KEY,
    kit_id ${ID} NOT NULL,
    revision_id ${ID} NOT NULL,
    need JSON NOT NULL,
    state ENUM('waiting','building','ready','failed') NOT NULL DEFAULT 'waiting',
    percent TINYINT UNSIGNED NOT NULL DEFAULT 0,
    fault TEXT NULL,
    sha256 ${SHA} NULL,
    bytes BIGINT UNSIGNED NULL,
    created_at DATETIME(6) NOT NULL,
    used_at DATETIME(6) NOT NULL,
    KEY changed_bundles_used (used_at),
    KEY changed_bundles_revision (revision_id),
    KEY changed_bundles_sha (sha256),
    CONSTRAINT changed_bundles_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id)
  )`,
);
