import { Injectable } from '@nestjs/common';
import type { Answer, Clearance, Handled } from '@windchest/contracts';
import { CatalogueReader, type ReleasedRevision } from '../../catalogue/catalogue-reader.js';
import type { SignedIn } from '../../http/person.js';
import { notFound } from '../../http/refusal.js';
import { OwnRevisions } from '../own-revisions.js';
import { KeepPrintRecord } from './keep-print-record.js';
import { ReprintLists } from './reprint-lists.js';

/** What is to print, and what is printed, of a kit on somebody's shelf. */
@Injectable()
export class ReprintPlans {
  constructor(
    private readonly catalogue: CatalogueReader,
    private readonly own: OwnRevisions,
    private readonly lists: ReprintLists,
    private readonly record: KeepPrintRecord,
  ) {}

  async plan(
    person: SignedIn,
    slug: string,
    revisionId?: string,
  ): Promise<Answer<'GET /shelf/:slug/reprint'>> {
    const { kitId, revision } = await this.find(person, slug, revisionId, 'newest');
    const { list, printed } = await this.lists.withState(person, kitId, revision.id);
    const sheet = await this.catalogue.printSheetOf(revision.id);
    if (!sheet) throw notFound('revision');
    const isListed = (code: string): boolean =>
      list.parts.some((part) => part.code === code && part.advice !== null && part.quantity > 0);
    const parts = sheet.parts
      .filter(({ code }) => isListed(code))
      .map((part) => inClearance(part, printed.clearance));
    return {
      list,
      sheet: {
        revision: revision.label,
        printSpec: sheet.printSpec,
        parts,
        unmeasured: sheet.unmeasured.filter(isListed),
      },
    };
  }

  async printed(
    person: SignedIn,
    slug: string,
    revisionId?: string,
  ): Promise<Answer<'GET /shelf/:slug/printed'>> {
    const { kitId, revision } = await this.find(person, slug, revisionId, 'held');
    return this.record.read({ personId: person.id, kitId }, revision);
  }

  async sayPrinted(
    person: SignedIn,
    slug: string,
    { revisionId, ...said }: Handled<'PUT /shelf/:slug/printed'>['body'],
  ): Promise<Answer<'PUT /shelf/:slug/printed'>> {
    const { kitId, revision } = await this.find(person, slug, revisionId, 'held');
    const whose = { personId: person.id, kitId };
    await this.record.say(whose, revision, said);
    return this.record.read(whose, revision);
  }

  async forget(person: SignedIn, slug: string): Promise<void> {
    const { kitId } = await this.find(person, slug, undefined, 'newest');
    await this.record.forget({ personId: person.id, kitId });
  }

  /** @throws Refusal `not-found` for a kit that is not on the shelf, or a revision it does not have */
  async find(
    person: SignedIn,
    slug: string,
    revisionId: string | undefined,
    otherwise: 'newest' | 'held',
  ): Promise<{ kitId: string; kitName: string; revision: ReleasedRevision }> {
    const kit = await this.catalogue.kitBySlug(slug);
    const { covered, all, newest, heldRevisionId } = kit
      ? await this.own.of(person.id, kit.id)
      : { covered: [], all: [], newest: null, heldRevisionId: null };
    if (!kit || !newest) throw notFound('kit on your shelf');
    const held = all.find(({ id }) => id === heldRevisionId) ?? newest;
    const named = revisionId && [...covered, held].find(({ id }) => id === revisionId);
    const revision = revisionId ? named : otherwise === 'held' ? held : newest;
    if (!revision) throw notFound('revision');
    return { kitId: kit.id, kitName: kit.name, revision };
  }
}

type SheetPart = Answer<'GET /kits/:slug/print'>['parts'][number];

/** In the shape somebody prints; nothing is left to choose. */
const inClearance = (part: SheetPart, clearance: Clearance | null): SheetPart => {
  const { clearance: _, ...shape } = part.variants.find((one) => one.clearance === clearance) ?? {
    clearance: null,
  };
  return { ...part, ...shape, isGauge: false, variants: [] };
};
