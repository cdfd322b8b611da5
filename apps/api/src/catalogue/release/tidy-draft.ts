import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Gate } from '@windchest/contracts';
import { Op } from 'sequelize';
import type { Tx } from '../../database/transactions.js';
import { Differences } from '../comparison/differences.js';
import { GateWaiver } from '../gates/gate-waiver.model.js';
import { Part } from '../revisions/part.model.js';
import type { Revision } from '../revisions/revision.model.js';

/** What a draft no longer needs does not go down with the revision it becomes. */
@Injectable()
export class TidyDraft {
  constructor(
    @InjectModel(GateWaiver) private readonly waivers: typeof GateWaiver,
    @InjectModel(Part) private readonly parts: typeof Part,
    private readonly differences: Differences,
  ) {}

  async tidy(tx: Tx, revision: Revision, gates: readonly Gate[]): Promise<void> {
    const waived = gates.filter((gate) => gate.state === 'waived').map((gate) => gate.name);
    await this.waivers.destroy({
      where: { revisionId: revision.id, gate: { [Op.notIn]: waived } },
      transaction: tx,
    });
    // A mark given before the shapes turned out to be the same would send people to the printer.
    const earlier = await this.differences.lastReleasedBefore(revision, tx);
    const rows = earlier ? await this.differences.rows(earlier, revision, tx) : [];
    const changed = rows.filter((row) => row.difference === 'changed').map((row) => row.code);
    await this.parts.update(
      { reprintMark: null, reprintReason: '' },
      {
        where: { revisionId: revision.id, code: { [Op.notIn]: changed }, reprintMark: { [Op.ne]: null } },
        transaction: tx,
      },
    );
  }
}
