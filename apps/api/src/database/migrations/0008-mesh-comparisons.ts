import { guardContents } from './released-guards.js';
import { inOrder } from './statements.js';

const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/**
 * What came of comparing two meshes, once for each pair however many revisions hold them. A waiver keeps
 * what the gate said when it was written, and stays with its revision once that is released.
 */
export const up = inOrder(
  `CREATE TABLE mesh_comparisons (
    before_sha ${SHA} NOT NULL,
    after_sha ${SHA} NOT NULL,
    comparator_version INT UNSIGNED NOT NULL,
    state ENUM('waiting','comparing','compared','failed') NOT NULL DEFAULT 'waiting',
    tries INT UNSIGNED NOT NULL DEFAULT 0,
    result JSON NULL,
    fault_code VARCHAR(60) NULL,
    fault TEXT NULL,
    compared_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    PRIMARY KEY (before_sha, after_sha),
    KEY mesh_comparisons_after (after_sha),
    CONSTRAINT mesh_comparisons_before_fk FOREIGN KEY (before_sha) REFERENCES stored_files (sha256),
    CONSTRAINT mesh_comparisons_after_fk FOREIGN KEY (after_sha) REFERENCES stored_files (sha256)
  )`,
  `ALTER TABLE gate_waivers ADD COLUMN waived_against TEXT NOT NULL DEFAULT ''`,
  ...guardContents('gate_waivers'),
);
