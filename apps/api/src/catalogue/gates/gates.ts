import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Gate } from '@windchest/contracts';
import type { Tx } from '../../database/transactions.js';
import { Differences } from '../comparison/differences.js';
import { Licence } from '../kits/licence.model.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { isFinal, type Revision } from '../revisions/revision.model.js';
import { applyWaiver } from './apply-waiver.js';
import { changesMarked } from './change-gate.js';
import { notNeeded, type GateCheck } from './gate-facts.js';
import { GateWaiver } from './gate-waiver.model.js';
import { fitsBuildVolume, partsMeasured, watertight } from './mesh-gates.js';
import { licenceAndPrice } from './sale-gate.js';
import { voicesInTune } from './voice-gate.js';
import { assemblyNotes, cautions, changeNotes } from './word-gates.js';

const checks: readonly GateCheck[] = [
  partsMeasured,
  watertight,
  fitsBuildVolume,
  voicesInTune,
  assemblyNotes,
  changeNotes,
  changesMarked,
  cautions,
  licenceAndPrice,
  () => notNeeded('proof-round', 'No proof round was asked for.'),
];

/** What stands between a draft and its release. */
@Injectable()
export class Gates {
  constructor(
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(GateWaiver) private readonly waivers: typeof GateWaiver,
    private readonly contents: RevisionContents,
    private readonly differences: Differences,
  ) {}

  async of(revision: Revision, tx?: Tx): Promise<Gate[]> {
    const parts = await this.contents.partsOf(revision.id, tx);
    const licences = await this.licences.findAll({
      where: { kitId: revision.kitId },
      transaction: tx ?? null,
    });
    const earlier = await this.differences.lastReleasedBefore(revision, tx);
    const changes = earlier ? await this.differences.rows(earlier, revision, tx) : null;
    const waivers = await this.waivers.findAll({
      where: { revisionId: revision.id },
      transaction: tx ?? null,
    });
    return checks.map((check) => {
      const gate = check({ revision, parts, licences, changes });
      const waiver = waivers.find((one) => one.gate === gate.name);
      return applyWaiver(gate, waiver, isFinal(revision));
    });
  }
}
