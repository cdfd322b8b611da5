import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/** What buyers say about how parts fit, and the workshop's answers. */
export const up = inOrder(
  `CREATE TABLE fit_reports (
    id ${ID} NOT NULL PRIMARY KEY,
    kit_id ${ID} NOT NULL,
    revision_id ${ID} NOT NULL,
    part_code VARCHAR(10) NOT NULL,
    part_name VARCHAR(120) NOT NULL,
    clearance ENUM('minus','zero','plus') NULL,
    person_id ${ID} NOT NULL,
    printer_name VARCHAR(80) NOT NULL,
    material VARCHAR(40) NOT NULL,
    nozzle_mm DECIMAL(4,2) NOT NULL,
    layer_mm DECIMAL(4,2) NOT NULL,
    verdict ENUM('far-too-tight','tight','right','loose','far-too-loose') NOT NULL,
    gap_mm DECIMAL(5,2) NULL,
    words TEXT NOT NULL,
    picture_sha256 ${SHA} NULL,
    picture_type VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
    picture_bytes INT UNSIGNED NULL,
    state ENUM('new','answered','planned','fixed','closed') NOT NULL DEFAULT 'new',
    fixed_in_id ${ID} NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    KEY fit_reports_kit (kit_id, state, created_at),
    KEY fit_reports_part (kit_id, part_code, material),
    KEY fit_reports_person (person_id, kit_id, created_at),
    KEY fit_reports_state (state, created_at),
    KEY fit_reports_fix (fixed_in_id),
    CONSTRAINT fit_reports_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id),
    CONSTRAINT fit_reports_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id),
    CONSTRAINT fit_reports_fix_fk FOREIGN KEY (fixed_in_id) REFERENCES revisions (id) ON DELETE SET NULL
  )`,
  `CREATE TABLE fit_answers (
    id ${ID} NOT NULL PRIMARY KEY,
    report_id ${ID} NOT NULL,
    author_id ${ID} NOT NULL,
    author_name VARCHAR(80) NOT NULL,
    text TEXT NOT NULL,
    created_at DATETIME(6) NOT NULL,
    KEY fit_answers_report (report_id, created_at),
    CONSTRAINT fit_answers_report_fk FOREIGN KEY (report_id) REFERENCES fit_reports (id) ON DELETE CASCADE
  )`,
);
