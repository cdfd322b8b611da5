import { guardContents, REFUSE } from './released-guards.js';
import { inOrder } from './statements.js';

/** What makes a revision what it is. Withdrawing, and figures computed from it later, leave these alone. */
const protectedColumns = [
  'id',
  'kit_id',
  'mark',
  'issue',
  'based_on_id',
  'assembly_notes',
  'change_notes',
  'cautions',
  'print_spec',
  'hardware',
  'build_volume',
  'declared_cents',
  'room',
  'bundle_sha256',
  'bundle_bytes',
  'released_at',
  'released_by',
  'created_at',
];
/**
 * The database itself keeps released revisions as they are: whatever program writes, a mistake becomes a
 * new revision. Withdrawing is the one step that is left to a released one.
 */
export const up = inOrder(
  `CREATE TRIGGER revisions_released_update BEFORE UPDATE ON revisions FOR EACH ROW
   BEGIN
     IF OLD.state IN ('released', 'withdrawn') AND (
       NOT (NEW.state = OLD.state OR (OLD.state = 'released' AND NEW.state = 'withdrawn'))
       OR ${protectedColumns.map((column) => `NOT (NEW.${column} <=> OLD.${column})`).join(' OR ')}
     ) THEN ${REFUSE}; END IF;
     IF NEW.state = 'released' AND (NEW.bundle_sha256 IS NULL OR NEW.bundle_bytes IS NULL OR NEW.released_at IS NULL) THEN
       SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A revision is released with its bundle and its date.';
     END IF;
   END`,
  `CREATE TRIGGER revisions_released_delete BEFORE DELETE ON revisions FOR EACH ROW
   IF OLD.state IN ('released', 'withdrawn') THEN ${REFUSE}; END IF`,
  ...guardContents('parts'),
  ...guardContents('revision_files'),
);
