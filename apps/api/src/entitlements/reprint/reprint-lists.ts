import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Clearance, ReprintList } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { PrinterCards } from '../../accounts/printers/printer-cards.js';
import { CatalogueReader, type NetRow, type ReleasedRevision } from '../../catalogue/catalogue-reader.js';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import { PrintRecords } from './print-records.js';
import { pairsNeeded, reprintListOf, type PrintedState } from './reprint-list.js';

/** Whose list: an account's, or that of an address that bought without one. */
export interface Reader {
  readonly personId: string | null;
  readonly email: string;
}

interface HeldRow {
  person_id: string | null;
  email: string;
  held_revision_id: string | null;
  clearance: Clearance | null;
}

const CHUNK = 500;
const UNKNOWN: PrintedState = { heldRevisionId: null, clearance: null, record: new Map() };

/**
 * For one person, or many at once: the parts that differ between what they have printed and a revision of the
 * kit. What is printed is what they said part by part; for a part nobody said anything of, the revision held.
 */
@Injectable()
export class ReprintLists {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly catalogue: CatalogueReader,
    private readonly printers: PrinterCards,
    private readonly records: PrintRecords,
  ) {}

  /** @throws Refusal `not-found` where the kit has no such released revision */
  async listFor(person: { id: string }, kitId: string, toRevisionId: string): Promise<ReprintList> {
    const { list } = await this.withState(person, kitId, toRevisionId);
    return list;
  }

  /** The list and what it was made from. */
  async withState(
    person: { id: string },
    kitId: string,
    toRevisionId: string,
  ): Promise<{ list: ReprintList; printed: PrintedState }> {
    const printed = await this.stateOf(person, kitId);
    return { list: await this.listOf(kitId, toRevisionId, printed), printed };
  }

  async stateOf(person: { id: string }, kitId: string): Promise<PrintedState> {
    return (await this.statesOf(kitId, [{ personId: person.id, email: '' }]))[0] ?? UNKNOWN;
  }

  async listOf(kitId: string, toRevisionId: string, printed: PrintedState): Promise<ReprintList> {
    return (await this.open(kitId, toRevisionId)).of(printed);
  }

  /**
   * The lists of many, in the order they are asked for, a chunk at a time: three queries for each five hundred
   * readers, and one comparison for each pair of revisions that occurs among them.
   */
  async *listsFor(
    kitId: string,
    toRevisionId: string,
    readers: readonly Reader[],
  ): AsyncGenerator<{ reader: Reader; list: ReprintList }> {
    const lists = await this.open(kitId, toRevisionId);
    for (let at = 0; at < readers.length; at += CHUNK) {
      const chunk = readers.slice(at, at + CHUNK);
      const states = await this.statesOf(kitId, chunk);
      for (const [index, reader] of chunk.entries())
        yield { reader, list: await lists.of(states[index] ?? UNKNOWN) };
    }
  }

  /** Lists to one revision; what differs between two revisions is worked out once for all that are asked of it. */
  async open(kitId: string, toRevisionId: string): Promise<ListsTo> {
    const revisions = await this.catalogue.revisionsOf(kitId);
    const to = revisions.find(({ id }) => id === toRevisionId);
    if (!to) throw notFound('revision');
    return new ListsTo(this.catalogue, revisions, to);
  }

  private async statesOf(kitId: string, readers: readonly Reader[]): Promise<PrintedState[]> {
    const personIds = readers.flatMap(({ personId }) => personId ?? []);
    const emails = readers.flatMap(({ personId, email }) => (personId ? [] : email));
    // Of several rights to one kit the one whose files were fetched last comes first: prints stay, whatever ends.
    const held = await selectRows<HeldRow>(
      this.database,
      `SELECT person_id, email, held_revision_id, clearance FROM entitlements
       WHERE kit_id = :kitId
         AND (person_id IN (:personIds) OR (person_id IS NULL AND email IN (:emails)))
       ORDER BY held_since IS NULL, held_since DESC, state <> 'active', created_at`,
      { kitId, personIds: [...personIds, ''], emails: [...emails, ''] },
    );
    const first = new Map<string, HeldRow>();
    for (const row of held) {
      const name = nameOf({ personId: row.person_id, email: row.email });
      const known = first.get(name);
      if (!known) first.set(name, row);
      else if (known.clearance === null) first.set(name, { ...known, clearance: row.clearance });
    }
    const habits = await this.printers.habitsOf(personIds);
    const records = await this.records.ofMany(kitId, personIds);
    return readers.map((reader) => {
      const row = first.get(nameOf(reader));
      return {
        heldRevisionId: row?.held_revision_id ?? null,
        clearance: row?.clearance ?? (reader.personId ? (habits.get(reader.personId) ?? null) : null),
        record: (reader.personId && records.get(reader.personId)) || new Map(),
      };
    });
  }
}

const nameOf = ({ personId, email }: Reader): string => personId ?? `mail:${email.toLowerCase()}`;

/** Lists to one revision; what differs between two revisions is asked once. */
export class ListsTo {
  private readonly asked = new Map<string, Promise<ReadonlyMap<string, NetRow>>>();

  constructor(
    private readonly catalogue: CatalogueReader,
    private readonly revisions: readonly ReleasedRevision[],
    private readonly to: ReleasedRevision,
  ) {}

  async of(printed: PrintedState): Promise<ReprintList> {
    const rows = new Map<string, ReadonlyMap<string, NetRow>>();
    for (const [from, clearance] of pairsNeeded(printed))
      rows.set(pairName(from, clearance), await this.net(from, clearance));
    return reprintListOf({
      printed,
      to: this.to,
      revisions: this.revisions,
      net: (from, clearance) => rows.get(pairName(from, clearance)) ?? new Map<string, NetRow>(),
    });
  }

  private net(from: string | null, clearance: Clearance | null): Promise<ReadonlyMap<string, NetRow>> {
    const name = pairName(from, clearance);
    const known =
      this.asked.get(name) ??
      this.catalogue
        .netDifferences(from, this.to.id, clearance)
        .then((rows) => new Map(rows.map((row) => [row.code, row])));
    this.asked.set(name, known);
    return known;
  }
}

const pairName = (from: string | null, clearance: Clearance | null): string => `${from} ${clearance}`;
