import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/**
 * Kits, licences, revisions with their parts and files, and what the files measure. File names that differ
 * in capitals alone would overwrite each other on many disks and are one; accents do tell them apart.
 */
export const up = inOrder(
  `CREATE TABLE kits (
    id ${ID} NOT NULL PRIMARY KEY,
    slug VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    name VARCHAR(60) NOT NULL,
    tagline VARCHAR(200) NOT NULL,
    description MEDIUMTEXT NOT NULL,
    colour VARCHAR(20) NOT NULL,
    is_listed BOOLEAN NOT NULL DEFAULT FALSE,
    newest_revision_id ${ID} NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY kits_slug (slug),
    KEY kits_listed (is_listed, created_at)
  )`,
  `CREATE TABLE licences (
    id ${ID} NOT NULL PRIMARY KEY,
    kit_id ${ID} NOT NULL,
    kind ENUM('personal','small-run','classroom') NOT NULL,
    name VARCHAR(120) NOT NULL,
    terms MEDIUMTEXT NOT NULL,
    price_minor INT UNSIGNED NOT NULL,
    yearly_limit INT UNSIGNED NULL,
    is_offered BOOLEAN NOT NULL DEFAULT TRUE,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    KEY licences_kit (kit_id, is_offered),
    CONSTRAINT licences_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id)
  )`,
  `CREATE TABLE stored_files (
    sha256 ${SHA} NOT NULL PRIMARY KEY,
    bytes BIGINT UNSIGNED NOT NULL,
    kind VARCHAR(10) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    created_at DATETIME(6) NOT NULL
  )`,
  `CREATE TABLE revisions (
    id ${ID} NOT NULL PRIMARY KEY,
    kit_id ${ID} NOT NULL,
    mark INT UNSIGNED NOT NULL,
    issue INT UNSIGNED NOT NULL,
    state ENUM('draft','proving','released','withdrawn') NOT NULL DEFAULT 'draft',
    based_on_id ${ID} NULL,
    assembly_notes MEDIUMTEXT NOT NULL,
    change_notes MEDIUMTEXT NOT NULL,
    cautions MEDIUMTEXT NOT NULL,
    print_spec JSON NOT NULL,
    hardware JSON NOT NULL,
    build_volume JSON NOT NULL,
    declared_cents DECIMAL(6,2) NOT NULL,
    room JSON NOT NULL,
    print_estimate JSON NULL,
    release_state ENUM('not-started','waiting','building','failed','done') NOT NULL DEFAULT 'not-started',
    release_percent TINYINT UNSIGNED NOT NULL DEFAULT 0,
    release_fault TEXT NULL,
    bundle_sha256 ${SHA} NULL,
    bundle_bytes BIGINT UNSIGNED NULL,
    released_at DATETIME(6) NULL,
    released_by ${ID} NULL,
    withdrawn_at DATETIME(6) NULL,
    withdrawn_reason TEXT NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY revisions_number (kit_id, mark, issue),
    KEY revisions_state (kit_id, state, released_at),
    CONSTRAINT revisions_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id)
  )`,
  `CREATE TABLE revision_files (
    id ${ID} NOT NULL PRIMARY KEY,
    revision_id ${ID} NOT NULL,
    sha256 ${SHA} NOT NULL,
    file_name VARCHAR(200) COLLATE utf8mb4_uca1400_as_ci NOT NULL,
    created_at DATETIME(6) NOT NULL,
    UNIQUE KEY revision_files_name (revision_id, file_name),
    KEY revision_files_sha (sha256),
    CONSTRAINT revision_files_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE,
    CONSTRAINT revision_files_stored_fk FOREIGN KEY (sha256) REFERENCES stored_files (sha256)
  )`,
  `CREATE TABLE parts (
    id ${ID} NOT NULL PRIMARY KEY,
    revision_id ${ID} NOT NULL,
    file_id ${ID} NULL,
    code VARCHAR(10) NOT NULL,
    name VARCHAR(120) NOT NULL,
    quantity INT UNSIGNED NOT NULL DEFAULT 1,
    orientation ENUM('as-exported','may-turn','may-lie') NOT NULL DEFAULT 'may-turn',
    print_spec JSON NULL,
    voice JSON NULL,
    reprint_mark ENUM('reprint needed','reprint if it troubles you') NULL,
    reprint_reason VARCHAR(300) NOT NULL DEFAULT '',
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY parts_code (revision_id, code),
    KEY parts_file (file_id),
    CONSTRAINT parts_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE,
    CONSTRAINT parts_file_fk FOREIGN KEY (file_id) REFERENCES revision_files (id) ON DELETE SET NULL
  )`,
  `CREATE TABLE measurements (
    sha256 ${SHA} NOT NULL PRIMARY KEY,
    state ENUM('waiting','measuring','measured','refused') NOT NULL DEFAULT 'waiting',
    measurer_version INT UNSIGNED NOT NULL,
    tries INT UNSIGNED NOT NULL DEFAULT 0,
    measurement JSON NULL,
    geometry_hash VARCHAR(128) CHARACTER SET ascii COLLATE ascii_bin NULL,
    drawings JSON NULL,
    preview_sha256 ${SHA} NULL,
    fault_code VARCHAR(60) NULL,
    fault TEXT NULL,
    measured_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    CONSTRAINT measurements_stored_fk FOREIGN KEY (sha256) REFERENCES stored_files (sha256)
  )`,
  `CREATE TABLE gate_waivers (
    revision_id ${ID} NOT NULL,
    gate VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    reason VARCHAR(500) NOT NULL,
    waived_by ${ID} NOT NULL,
    waived_by_name VARCHAR(80) NOT NULL,
    waived_at DATETIME(6) NOT NULL,
    PRIMARY KEY (revision_id, gate),
    CONSTRAINT gate_waivers_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE
  )`,
);
