import { Injectable } from '@nestjs/common';
import { CatalogueReader, type ReprintRow } from '../catalogue/catalogue-reader.js';

export interface ToPrint {
  readonly code: string;
  readonly name: string;
  readonly quantity: number;
  readonly isOnlyIfItTroubles: boolean;
  /** The maker's reason, else what differs. */
  readonly why: string;
}

export interface ReprintBook {
  /** What one reader has to print to come from the revision held (null: none) to the letter's one. */
  listOf(heldRevisionId: string | null): Promise<readonly ToPrint[]>;
  /** Those of the revisions whose holders have nothing to print. */
  needingNothing(heldRevisionIds: readonly string[]): Promise<string[]>;
}

/** Reprint lists for readers of letters; each difference of two revisions is worked out once for a book. */
@Injectable()
export class ReprintBooks {
  constructor(private readonly catalogue: CatalogueReader) {}

  open(toRevisionId: string): ReprintBook {
    const known = new Map<string | null, Promise<readonly ToPrint[]>>();
    const listOf = (held: string | null): Promise<readonly ToPrint[]> => {
      const list =
        known.get(held) ?? this.catalogue.differences(held, toRevisionId).then((rows) => toPrint(rows));
      known.set(held, list);
      return list;
    };
    return {
      listOf,
      needingNothing: async (heldIds) => {
        const lists = await Promise.all(heldIds.map(async (id) => [id, await listOf(id)] as const));
        return lists.filter(([, list]) => list.length === 0).map(([id]) => id);
      },
    };
  }
}

/** New parts and those marked as needed first, then those to print only if the old ones trouble. */
export const toPrint = (rows: readonly ReprintRow[]): ToPrint[] =>
  rows
    .filter(({ difference, mark }) => difference === 'new' || mark !== null)
    .map(({ code, name, quantity, difference, mark, reason, whatDiffers }) => ({
      code,
      name,
      quantity,
      isOnlyIfItTroubles: difference !== 'new' && mark === 'reprint if it troubles you',
      why: reason || whatDiffers,
    }))
    .sort((a, b) => Number(a.isOnlyIfItTroubles) - Number(b.isOnlyIfItTroubles));
