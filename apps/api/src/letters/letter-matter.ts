import { Injectable } from '@nestjs/common';
import type { LetterBody } from '@windchest/contracts';
import { CatalogueReader, type KitFacts, type ReleasedRevision } from '../catalogue/catalogue-reader.js';
import { Refusal } from '../http/refusal.js';

/** What a letter is about, as the catalogue has it now. */
export interface LetterMatter {
  readonly kit: KitFacts | null;
  /** Null for a letter about no kit, or about a kit without a revision. */
  readonly target: ReleasedRevision | null;
  /** Released and withdrawn ones of the kit, newest first. */
  readonly revisions: readonly ReleasedRevision[];
}

@Injectable()
export class LetterMatters {
  constructor(private readonly catalogue: CatalogueReader) {}

  /** @throws Refusal `validation-failed` where kit and revisions do not belong together */
  async of({ kitId, revisionId }: Pick<LetterBody, 'kitId' | 'revisionId'>): Promise<LetterMatter> {
    if (kitId === null) {
      if (revisionId !== null) throw wrong('revisionId', 'Choose the kit first, then its revision.');
      return { kit: null, target: null, revisions: [] };
    }
    const [kit] = await this.catalogue.kitsByIds([kitId]);
    if (!kit) throw wrong('kitId', 'This kit does not exist any more. Choose it again.');
    const revisions = await this.catalogue.revisionsOf(kitId);
    const target =
      revisionId === null
        ? revisions.find((one) => !one.isWithdrawn)
        : revisions.find((one) => one.id === revisionId);
    if (revisionId !== null && !target)
      throw wrong('revisionId', 'This revision is not a released one of this kit. Choose it again.');
    return { kit, target: target ?? null, revisions };
  }
}

const wrong = (field: string, sentence: string): Refusal =>
  new Refusal('validation-failed', sentence, { fields: { [field]: sentence } });

/** Ids of the revisions between two, both counted; `revisions` go from the newest to the oldest. */
export const heldBetween = (
  revisions: readonly { id: string }[],
  fromId: string | null,
  toId: string | null,
): string[] => {
  const newest = toId === null ? 0 : revisions.findIndex(({ id }) => id === toId);
  const oldest = fromId === null ? revisions.length - 1 : revisions.findIndex(({ id }) => id === fromId);
  return newest < 0 || oldest < 0 ? [] : revisions.slice(newest, oldest + 1).map(({ id }) => id);
};
