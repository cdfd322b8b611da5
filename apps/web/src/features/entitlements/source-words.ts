import type { ShelfItem } from '@windchest/contracts';
import { shelfTexts, sourceTexts } from '../../config/texts/shelf.js';
import { date } from '../../lib/format.js';

/** By what a kit is on the shelf, each with its moment: since when, paid until, or when what is left of it ended. */
export const sourceWords = (item: Pick<ShelfItem, 'sources'>): string[] =>
  item.sources.map(({ source, since, until, releasedBefore }) => {
    const name = sourceTexts[source];
    if (releasedBefore) return shelfTexts.keptFrom(name, date(releasedBefore));
    return until ? shelfTexts.paidUntil(name, date(until)) : shelfTexts.since(name, date(since));
  });
