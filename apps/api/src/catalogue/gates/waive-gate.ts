import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Gate, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { touchRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { Drafts } from '../revisions/drafts.js';
import { GateWaiver } from './gate-waiver.model.js';
import { Gates } from './gates.js';

/** Lets a draft pass a gate that is open, with a written reason; or no longer. */
@Injectable()
export class WaiveGate {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(GateWaiver) private readonly waivers: typeof GateWaiver,
    private readonly transactions: Transactions,
    private readonly drafts: Drafts,
    private readonly gates: Gates,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async waive(
    person: SignedIn,
    { params, body }: Handled<'PUT /workshop/revisions/:revisionId/waivers/:gate'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { revision, subject } = await this.drafts.lock(tx, params.revisionId);
      const gate = (await this.gates.of(revision, tx)).find((one) => one.name === params.gate);
      const against = assertWaivable(params.gate, gate);
      await touchRows(
        this.database,
        `INSERT INTO gate_waivers (revision_id, gate, reason, waived_against, waived_by, waived_by_name, waived_at)
         VALUES (:revisionId, :gate, :reason, :against, :personId, :name, :now)
         ON DUPLICATE KEY UPDATE reason = VALUES(reason), waived_against = VALUES(waived_against),
           waived_by = VALUES(waived_by), waived_by_name = VALUES(waived_by_name), waived_at = VALUES(waived_at)`,
        {
          ...params,
          reason: body.reason,
          against,
          personId: person.id,
          name: person.name,
          now: this.clock.now(),
        },
        tx,
      );
      await this.staffLog.record(tx, person, {
        what: `waived the gate ${params.gate}`,
        subject,
        before: gate?.waiver && { reason: gate.waiver.reason, against: gate.waiver.against },
        after: { reason: body.reason, against },
      });
    });
  }

  async takeBack(
    person: SignedIn,
    { params }: Handled<'DELETE /workshop/revisions/:revisionId/waivers/:gate'>,
  ): Promise<void> {
    await this.transactions.run(async (tx) => {
      const { subject } = await this.drafts.lock(tx, params.revisionId);
      const waiver = await this.waivers.findOne({ where: { ...params }, transaction: tx });
      if (!waiver)
        throw new Refusal('not-found', `The gate ${params.gate} has no waiver that could be taken back.`);
      await waiver.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: `took the waiver of ${params.gate} back`,
        subject,
        before: { reason: waiver.reason, against: waiver.waivedAgainst, by: waiver.waivedByName },
      });
    });
  }
}

/** @returns what the gate says, which is what gets waived */
const assertWaivable = (name: Gate['name'], gate: Gate | undefined): string => {
  if (gate?.state === 'not-needed')
    throw new Refusal(
      'conflict',
      `The gate ${name} is not needed, so there is nothing to waive: ${gate.reason}`,
    );
  if (!gate?.mayBeWaived)
    throw new Refusal(
      'conflict',
      `The gate ${name} cannot be waived${gate?.state === 'open' ? `. ${gate.reason}` : '.'}`,
    );
  if (gate.state === 'passed')
    throw new Refusal('conflict', `The gate ${name} is passed, so there is nothing to waive: ${gate.reason}`);
  return gate.reason;
};
