import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Clearance } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { CatalogueReader, type NetRow, type ReleasedRevision } from '../../catalogue/catalogue-reader.js';
import { newId } from '../../database/columns.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { notFound, Refusal } from '../../http/refusal.js';
import type { PrintedPieces, PrintedState } from './reprint-list.js';
import { PrintRecord } from './print-record.model.js';
import { ReprintLists } from './reprint-lists.js';

interface Whose {
  readonly personId: string;
  readonly kitId: string;
}

/** What people say they have printed: part by part, all of a revision, or nothing after all. */
@Injectable()
export class KeepPrintRecord {
  constructor(
    @InjectModel(PrintRecord) private readonly records: typeof PrintRecord,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly lists: ReprintLists,
    private readonly clock: Clock,
  ) {}

  /** How far somebody's build of a revision is; before anything was said, the revision held is printed whole. */
  async read(
    { personId, kitId }: Whose,
    revision: ReleasedRevision,
  ): Promise<Answer<'GET /shelf/:slug/printed'>> {
    const { list, printed } = await this.lists.withState({ id: personId }, kitId, revision.id);
    return {
      revision: { id: revision.id, label: revision.label },
      isKept: printed.record.size > 0,
      parts: list.parts
        .filter(({ quantity }) => quantity > 0)
        .map(({ code, name, clearance, quantity, done, drawing }) => ({
          code,
          name,
          clearance,
          quantity,
          printed: done,
          drawing,
        })),
    };
  }

  /**
   * So many pieces of a part are there now, as the revision has it. Pieces of the same shape that were said of
   * another revision are among them; pieces of another shape are left as they are.
   */
  async say(
    whose: Whose,
    revision: ReleasedRevision,
    { code, quantity }: { code: string; quantity: number },
  ): Promise<void> {
    const state = await this.lists.stateOf({ id: whose.personId }, whose.kitId);
    const row = (await this.catalogue.netDifferences(null, revision.id, state.clearance)).find(
      (one) => one.code === code,
    );
    if (!row) throw new Refusal('not-found', `${revision.label} has no part ${code}.`);
    const pieces = piecesOf(revision.id, row, quantity, state.clearance);
    const same: PrintedPieces[] = [];
    for (const one of state.record.get(code) ?? [])
      if (await this.isAsIn(revision, whose.kitId, state, code, one)) same.push(one);
    await this.transactions.run(async (tx) => {
      for (const { revisionId, clearance } of [...same, pieces])
        await this.records.destroy({
          where: { ...whose, partCode: code, revisionId, ...(clearance && { clearance }) },
          transaction: tx,
        });
      const isOnly =
        (await this.records.count({ where: { ...whose, partCode: code }, transaction: tx })) === 0;
      // "None" has to be kept as a word: without it the revision held would count as printed.
      if (quantity > 0 || isOnly) await this.write(tx, whose, [{ code, pieces }]);
    });
  }

  /** All of a revision is printed: this takes the place of all that was said before. */
  async fill(
    tx: Tx,
    whose: Whose,
    rows: readonly NetRow[],
    revisionId: string,
    clearance: Clearance | null,
  ): Promise<void> {
    await this.records.destroy({ where: { ...whose }, transaction: tx });
    await this.write(
      tx,
      whose,
      rows.map((row) => ({ code: row.code, pieces: piecesOf(revisionId, row, row.quantity, clearance) })),
    );
  }

  async forget(whose: Whose): Promise<void> {
    if ((await this.records.destroy({ where: { ...whose } })) === 0)
      throw notFound('print record of this kit');
  }

  private async isAsIn(
    revision: ReleasedRevision,
    kitId: string,
    { clearance }: PrintedState,
    code: string,
    pieces: PrintedPieces,
  ): Promise<boolean> {
    const one = { ...pieces, quantity: 1 };
    const list = await this.lists.listOf(kitId, revision.id, {
      heldRevisionId: null,
      clearance,
      record: new Map([[code, [one]]]),
    });
    return list.parts.some((part) => part.code === code && part.done > 0);
  }

  private async write(
    tx: Tx,
    whose: Whose,
    said: readonly { code: string; pieces: PrintedPieces }[],
  ): Promise<void> {
    await this.records.bulkCreate(
      said.map(({ code, pieces }) => ({
        id: newId(),
        ...whose,
        partCode: code,
        ...pieces,
        clearance: pieces.clearance ?? 'zero',
        at: this.clock.now(),
      })),
      { transaction: tx },
    );
  }
}

/** Of a part that comes in several, that of the person's clearance, or the zero while none is known. */
const piecesOf = (
  revisionId: string,
  row: NetRow,
  quantity: number,
  wanted: Clearance | null,
): PrintedPieces => {
  const clearance = wanted && wanted in row.hashes ? wanted : 'zero';
  return { revisionId, clearance, quantity, geometryHash: row.hashes[clearance] ?? null };
};
