import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { newId } from '../database/columns.js';
import type { Tx } from '../database/transactions.js';
import { PledgeRightsSteps, type PledgeShelf } from '../supporters/pledges/pledge-steps.js';
import { Entitlement } from './entitlement.model.js';
import { covers, type ReleaseBounds } from './may-download.js';

/**
 * Entitlements that come from pledges, one for each kit: whole while the pledge is paid, then cut to what the plan
 * lets stay. Run again with the same facts it changes nothing.
 */
@Injectable()
export class PledgeEntitlements implements OnModuleInit {
  constructor(
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    private readonly rights: PledgeRightsSteps,
    private readonly catalogue: CatalogueReader,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.rights.register({ name: 'entitlements', order: 10, run: (tx, shelf) => this.follow(tx, shelf) });
  }

  private async follow(tx: Tx, shelf: PledgeShelf): Promise<void> {
    const known = await this.entitlements.findAll({
      where: { pledgeId: shelf.pledgeId },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    });
    for (const one of known) {
      const isIncluded = shelf.hasAllKits || shelf.kitIds.includes(one.kitId);
      if (shelf.rights.isWhole && isIncluded) await this.makeWhole(tx, one, shelf.paidUntil);
      else await this.cut(tx, one, shelf);
    }
    if (!shelf.rights.isWhole) return;
    const held = new Set(known.map((one) => one.kitId));
    await this.give(
      tx,
      shelf,
      shelf.kitIds.filter((kitId) => !held.has(kitId)),
    );
  }

  private async give(tx: Tx, shelf: PledgeShelf, kitIds: readonly string[]): Promise<void> {
    if (kitIds.length === 0) return;
    const now = this.clock.now();
    // A pledge is for one's own prints; what else may be done is bought.
    const licences = (await this.catalogue.allOfferedLicences(tx)).filter(
      ({ licenceKind }) => licenceKind === 'personal',
    );
    await this.entitlements.bulkCreate(
      kitIds.map((kitId) => ({
        id: newId(),
        personId: shelf.personId,
        email: shelf.email,
        kitId,
        licenceId: licences.find((one) => one.kitId === kitId)?.licenceId ?? null,
        source: 'pledge',
        pledgeId: shelf.pledgeId,
        state: 'active',
        untilAt: shelf.paidUntil,
        createdAt: now,
        updatedAt: now,
      })),
      { transaction: tx },
    );
  }

  private async makeWhole(tx: Tx, one: Entitlement, untilAt: Date | null): Promise<void> {
    const whole = {
      state: 'active',
      releasedFrom: null,
      releasedBefore: null,
      endedAt: null,
      untilAt,
    } as const;
    await one.update({ ...whole, updatedAt: this.clock.now() }, { transaction: tx });
  }

  private async cut(tx: Tx, one: Entitlement, { rights }: PledgeShelf): Promise<void> {
    const isCutAlready = one.state === 'ended' || (one.state === 'active' && one.releasedBefore !== null);
    if (isCutAlready) return;
    const now = this.clock.now();
    const stays = rights.kept !== null && (await this.isAnythingIn(one.kitId, rights.kept));
    const state = stays ? 'active' : rights.isResting ? 'suspended' : 'ended';
    await one.update(
      {
        state,
        releasedFrom: stays ? (rights.kept?.releasedFrom ?? null) : null,
        releasedBefore: stays ? (rights.kept?.releasedBefore ?? null) : null,
        untilAt: null,
        endedAt: state === 'ended' ? now : null,
        updatedAt: now,
      },
      { transaction: tx },
    );
  }

  private async isAnythingIn(kitId: string, bounds: ReleaseBounds): Promise<boolean> {
    const revisions = await this.catalogue.revisionsOf(kitId);
    return revisions.some((one) => !one.isWithdrawn && covers(bounds, one.releasedAt));
  }
}
