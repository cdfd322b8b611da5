import { guardContents } from './released-guards.js';
import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/**
 * Parts in several clearances: a part's own file is the zero, its variants stand beside it. A gauge part
 * tells which one a printer needs; each clearance has a bundle of its own, and a buyer's choice is kept with
 * their right to the kit.
 */
export const up = inOrder(
  `ALTER TABLE parts ADD COLUMN is_gauge BOOLEAN NOT NULL DEFAULT FALSE`,
  `CREATE TABLE part_variants (
    id ${ID} NOT NULL PRIMARY KEY,
    revision_id ${ID} NOT NULL,
    part_id ${ID} NOT NULL,
    clearance ENUM('minus','plus') NOT NULL,
    file_id ${ID} NOT NULL,
    UNIQUE KEY part_variants_clearance (part_id, clearance),
    UNIQUE KEY part_variants_file (file_id),
    KEY part_variants_revision (revision_id),
    CONSTRAINT part_variants_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE,
    CONSTRAINT part_variants_part_fk FOREIGN KEY (part_id) REFERENCES parts (id) ON DELETE CASCADE,
    CONSTRAINT part_variants_file_fk FOREIGN KEY (file_id) REFERENCES revision_files (id) ON DELETE CASCADE
  )`,
  `CREATE TABLE revision_bundles (
    revision_id ${ID} NOT NULL,
    clearance ENUM('minus','zero','plus') NOT NULL,
    sha256 ${SHA} NOT NULL,
    bytes BIGINT UNSIGNED NOT NULL,
    PRIMARY KEY (revision_id, clearance),
    CONSTRAINT revision_bundles_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE
  )`,
  `ALTER TABLE entitlements ADD COLUMN clearance ENUM('minus','zero','plus') NULL`,
  ...guardContents('part_variants'),
  ...guardContents('revision_bundles'),
);
