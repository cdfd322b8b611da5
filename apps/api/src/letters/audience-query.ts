import { Injectable } from '@nestjs/common';
import type { LetterBody } from '@windchest/contracts';
import { PeopleParts } from '../accounts/people-parts.js';
import { valuesOf, type SqlPart } from '../database/sql-part.js';
import { ReaderParts } from '../entitlements/reader-parts.js';
import { ReporterParts } from '../fit/reporter-parts.js';
import { BuyerParts } from '../orders/buyer-parts.js';
import { heldBetween, type LetterMatter } from './letter-matter.js';
import { ReprintBooks } from './reprint-book.js';

export type AudienceOf = Pick<LetterBody, 'kind' | 'kitId' | 'audience' | 'leavesOutUnneeded'>;

/**
 * The one query behind an audience. Its rows are those whom the facts fit: `reader`, `person_id`, `email`,
 * `name`, `held`, `order_id`, and `left_out`, which says why somebody gets no letter all the same. Each
 * room gives the part that reads its own tables.
 */
@Injectable()
export class AudienceQuery {
  constructor(
    private readonly people: PeopleParts,
    private readonly owners: ReaderParts,
    private readonly buyers: BuyerParts,
    private readonly reporters: ReporterParts,
    private readonly books: ReprintBooks,
  ) {}

  async of(letter: AudienceOf, matter: LetterMatter): Promise<SqlPart> {
    const base = this.base(letter);
    const conditions = this.conditions(letter, matter);
    const reasons = await this.reasons(letter, matter);
    return {
      sql: `SELECT f.*, ${reasons.sql} AS left_out FROM (${base.sql}) f WHERE ${conditions.sql}`,
      values: valuesOf(base, conditions, reasons),
    };
  }

  /** Owners of the kit; of any kit; or, for news to everybody, whoever ever asked for them. */
  private base({ kind, kitId, audience }: AudienceOf): SqlPart {
    const people = this.people.people();
    if (isNewsToAll({ kind, kitId, audience }))
      return {
        sql: `SELECT COALESCE(CONVERT(p.id USING utf8mb4) COLLATE utf8mb4_unicode_ci, n.email) AS reader, p.id AS person_id, n.email,
            COALESCE(p.name, '') AS name, 1 AS is_active, 0 AS is_suspended, NULL AS held, NULL AS order_id,
            n.state AS news, d.id IS NOT NULL AS is_dead
          FROM news_readers n LEFT JOIN (${people.sql}) p ON p.email = n.email AND p.is_verified
          LEFT JOIN dead_addresses d ON d.email = n.email`,
        values: people.values,
      };
    const owners = this.owners.owners({
      kitId: audience.ownsKit ? kitId : null,
      sources: audience.sources,
    });
    return {
      sql: `SELECT o.reader, o.person_id, COALESCE(p.email, o.email) AS email, COALESCE(p.name, '') AS name,
          o.is_active, o.is_suspended, o.held, o.order_id, n.state AS news, d.id IS NOT NULL AS is_dead
        FROM (${owners.sql}) o LEFT JOIN (${people.sql}) p ON p.id = o.person_id
        LEFT JOIN news_readers n ON n.email = COALESCE(p.email, o.email)
        LEFT JOIN dead_addresses d ON d.email = COALESCE(p.email, o.email)`,
      values: valuesOf(owners, people),
    };
  }

  private conditions({ kind, kitId, audience }: AudienceOf, { revisions }: LetterMatter): SqlPart {
    const parts: SqlPart[] = [];
    const add = (sql: string, part: SqlPart | undefined = undefined): void => {
      parts.push({ sql, values: part?.values ?? {} });
    };
    const { heldFromId, heldToId, withNothingHeld, nozzlesMm, materials, reportedParts, countries } =
      audience;
    if (
      audience.ownsKit &&
      kitId !== null &&
      (heldFromId !== null || heldToId !== null || !withNothingHeld)
    ) {
      const between = heldBetween(revisions, heldFromId, heldToId);
      const held = between.length > 0 ? 'f.held IN (:heldBetween)' : 'FALSE';
      add(withNothingHeld ? `(${held} OR f.held IS NULL)` : held, {
        sql: '',
        values: { heldBetween: between },
      });
    }
    if (isNewsToAll({ kind, kitId, audience }) && audience.sources.length > 0) {
      const owners = this.owners.owners({ kitId: null, sources: audience.sources });
      add(`f.reader IN (SELECT bysource.reader FROM (${owners.sql}) bysource)`, owners);
    }
    if (nozzlesMm.length + materials.length > 0) {
      const cards = this.people.withPrinter({ nozzlesMm, materials });
      const reports = this.reporters.printingWith({ nozzlesMm, materials });
      add(`(f.person_id IN (${cards.sql}) OR f.person_id IN (${reports.sql}))`, {
        sql: '',
        values: valuesOf(cards, reports),
      });
    }
    if (reportedParts.length > 0 && kitId !== null) {
      const reported = this.reporters.ofParts(kitId, reportedParts);
      add(`f.person_id IN (${reported.sql})`, reported);
    }
    if (countries.length > 0) {
      const buyers = this.buyers.from(countries);
      add(`f.reader IN (${buyers.sql})`, buyers);
    }
    return { sql: parts.map(({ sql }) => sql).join(' AND ') || 'TRUE', values: valuesOf(...parts) };
  }

  private async reasons(letter: AudienceOf, { target, revisions }: LetterMatter): Promise<SqlPart> {
    const cases = [
      `WHEN f.is_active = 0 AND f.is_suspended = 1 THEN 'right-suspended'`,
      `WHEN f.is_active = 0 THEN 'right-ended'`,
      `WHEN f.is_dead = 1 THEN 'address-dead'`,
    ];
    const values: Record<string, unknown> = {};
    if (letter.kind === 'news' || letter.audience.askedForNews)
      cases.push(
        `WHEN f.news IS NULL THEN 'never-asked'`,
        `WHEN f.news = 'asked' THEN 'not-confirmed'`,
        `WHEN f.news = 'stopped' THEN 'stopped'`,
      );
    if (letter.leavesOutUnneeded && letter.audience.ownsKit && target) {
      const newer = revisions.slice(0, revisions.indexOf(target) + 1).map(({ id }) => id);
      const older = revisions.slice(revisions.indexOf(target) + 1).map(({ id }) => id);
      const needNothing = await this.books.open(target.id).needingNothing(older);
      cases.push(
        `WHEN f.held IS NULL THEN 'fetched-nothing'`,
        `WHEN f.held IN (:heldNewest) THEN 'has-newest'`,
      );
      values['heldNewest'] = newer;
      if (needNothing.length > 0) {
        cases.push(`WHEN f.held IN (:heldNeedNothing) THEN 'nothing-to-reprint'`);
        values['heldNeedNothing'] = needNothing;
      }
    }
    return { sql: `CASE ${cases.join(' ')} END`, values };
  }
}

const isNewsToAll = ({ kind, kitId, audience }: Pick<AudienceOf, 'kind' | 'kitId' | 'audience'>): boolean =>
  kind === 'news' && !(audience.ownsKit && kitId !== null);
