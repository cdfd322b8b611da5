import { createHash } from 'node:crypto';
import type { Clearance } from '@windchest/contracts';

export interface NeededPart {
  readonly code: string;
  readonly print: number;
  readonly optional: number;
}

/** What a bundle of changed parts is made from; nothing of the person who asks. */
export interface ChangedPartsNeed {
  readonly revisionId: string;
  readonly clearance: Clearance | null;
  /** Sorted by code. */
  readonly parts: readonly NeededPart[];
  /** The list in words, as Markdown: what was printed before stands in it as differences only. */
  readonly list: string;
}

/** Goes up when the same need would give another bundle. */
const VERSION = 1;

export const hashOfNeed = ({ revisionId, clearance, parts, list }: ChangedPartsNeed): string =>
  createHash('sha256')
    .update(
      JSON.stringify([
        VERSION,
        revisionId,
        clearance,
        parts.map(({ code, print, optional }) => [code, print, optional]),
        list,
      ]),
    )
    .digest('hex');
