import { Injectable } from '@nestjs/common';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { ReprintLists, type ListsTo } from '../entitlements/reprint/reprint-lists.js';
import { reprintLines, type ReprintLine } from '../entitlements/reprint/reprint-words.js';

export type ToPrint = ReprintLine;

/** Whose list: what an account says of its prints, else what is held counts as printed. */
export interface BookReader {
  readonly personId: string | null;
  readonly heldId: string | null;
}

export interface ReprintBook {
  /** What one reader has to print for the letter's revision. */
  listOf(reader: BookReader): Promise<readonly ToPrint[]>;
  /** Those of the revisions whose holders have nothing to print. */
  needingNothing(heldRevisionIds: readonly string[]): Promise<string[]>;
}

/** Reprint lists for readers of letters; each difference of two revisions is worked out once for a book. */
@Injectable()
export class ReprintBooks {
  constructor(
    private readonly catalogue: CatalogueReader,
    private readonly lists: ReprintLists,
  ) {}

  open(toRevisionId: string): ReprintBook {
    let opened: Promise<{ kitId: string; lists: ListsTo } | null> | undefined;
    const book = () => (opened ??= this.listsTo(toRevisionId));
    const ofHeld = async (heldRevisionId: string | null): Promise<readonly ToPrint[]> => {
      const found = await book();
      if (!found) return [];
      return reprintLines(await found.lists.of({ heldRevisionId, clearance: null, record: new Map() }));
    };
    return {
      listOf: async ({ personId, heldId }) => {
        const found = personId === null ? null : await book();
        if (!found || personId === null) return ofHeld(heldId);
        return reprintLines(await found.lists.of(await this.lists.stateOf({ id: personId }, found.kitId)));
      },
      needingNothing: async (heldIds) => {
        const all = await Promise.all(heldIds.map(async (id) => [id, await ofHeld(id)] as const));
        return all.filter(([, list]) => list.length === 0).map(([id]) => id);
      },
    };
  }

  private async listsTo(revisionId: string): Promise<{ kitId: string; lists: ListsTo } | null> {
    const revision = await this.catalogue.revisionById(revisionId);
    return revision && { kitId: revision.kitId, lists: await this.lists.open(revision.kitId, revisionId) };
  }
}
