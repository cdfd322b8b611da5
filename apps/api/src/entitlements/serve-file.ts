import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Response } from 'express';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { Storage } from '../adapters/storage/storage.js';
import { CatalogueReader, type BundleFile, type ServableFile } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { touchRows } from '../database/rows.js';
import type { SignedIn } from '../http/person.js';
import { Refusal } from '../http/refusal.js';
import { Download } from './download.model.js';
import { Entitlement } from './entitlement.model.js';
import { browserMark, downloadRefusal, withdrawnRefusal } from './file-grants.js';
import { covers } from './may-download.js';
import { sendStored } from './send-stored.js';
import { SignedAddress } from './signed-address.js';

export interface FileRequest {
  readonly grant: string;
  readonly person: SignedIn | null;
  readonly cookie: string | undefined;
  readonly isHead: boolean;
}

/** Hands out the file of a signed address to whom it was given, counts it, and notes what the buyer now holds. */
@Injectable()
export class ServeFile {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Download) private readonly downloads: typeof Download,
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    @InjectConfig() private readonly config: Config,
    private readonly addresses: SignedAddress,
    private readonly catalogue: CatalogueReader,
    private readonly storage: Storage,
    private readonly clock: Clock,
  ) {}

  async serve({ grant, person, cookie, isHead }: FileRequest, response: Response): Promise<void> {
    const { downloadId, boundTo } = this.addresses.read(grant);
    const isTheirs =
      'person' in boundTo
        ? person?.id === boundTo.person
        : cookie !== undefined && browserMark(cookie) === boundTo.browser;
    if (!isTheirs)
      throw new Refusal(
        'not-found',
        'There is no file at this address for you. An address works only where it was given out.',
      );
    const download = await this.downloads.findByPk(downloadId);
    const entitlement = download && (await this.entitlements.findByPk(download.entitlementId));
    if (entitlement?.state === 'suspended')
      throw downloadRefusal(entitlement.source === 'pledge' ? 'pledge-rests' : 'suspended');
    if (!download || !entitlement || !(await this.isStillTheirs(entitlement, download.revisionId)))
      throw new Refusal('forbidden', 'The right to this file has ended.');
    const revision = await this.catalogue.revisionById(download.revisionId);
    if (revision?.isWithdrawn) throw withdrawnRefusal(revision);
    const file: (ServableFile & Partial<BundleFile>) | null = download.isBundle
      ? await this.catalogue.bundleByHash(download.revisionId, download.sha256)
      : await this.catalogue.fileOf(download.revisionId, download.sha256);
    if (!file) throw new Refusal('not-found', 'There is no file at this address.');

    if (!isHead) await this.countRequest(download.id);
    const sent = await sendStored(response, file, this.storage, {
      accelPrefix: this.config.ACCEL_PREFIX,
      fileAddressSeconds: this.config.FILE_ADDRESS_MINUTES * 60,
    });
    if (isHead) return;
    await this.countSent(download, sent.bytes, sent.reachedEnd);
    if (sent.reachedEnd && download.isBundle) await this.noteHeld(download, file.clearance ?? null);
  }

  private async isStillTheirs(entitlement: Entitlement, revisionId: string): Promise<boolean> {
    if (entitlement.state !== 'active') return false;
    const isBounded = entitlement.releasedFrom !== null || entitlement.releasedBefore !== null;
    const revision = isBounded ? await this.catalogue.revisionById(revisionId) : null;
    return covers(entitlement, revision?.releasedAt ?? null);
  }

  private async countRequest(id: string): Promise<void> {
    await touchRows(
      this.database,
      'UPDATE downloads SET requests = requests + 1, first_request_at = COALESCE(first_request_at, :now) WHERE id = :id',
      { id, now: this.clock.now() },
    );
  }

  private async countSent(download: Download, bytes: number, reachedEnd: boolean): Promise<void> {
    const now = this.clock.now();
    await touchRows(
      this.database,
      'UPDATE downloads SET bytes_sent = bytes_sent + :bytes, completed_at = IF(:reachedEnd, COALESCE(completed_at, :now), completed_at) WHERE id = :id',
      {
        id: download.id,
        bytes,
        reachedEnd,
        now,
      },
    );
  }

  /** Whoever fetched a bundle holds its revision; whoever fetched one clearance, and said no other, prints that. */
  private async noteHeld(download: Download, clearance: BundleFile['clearance']): Promise<void> {
    const values = {
      id: download.entitlementId,
      revisionId: download.revisionId,
      clearance,
      now: this.clock.now(),
    };
    await touchRows(
      this.database,
      'UPDATE entitlements SET held_revision_id = :revisionId, held_since = :now, updated_at = :now WHERE id = :id AND NOT (held_revision_id <=> :revisionId)',
      values,
    );
    if (clearance)
      await touchRows(
        this.database,
        'UPDATE entitlements SET clearance = :clearance, updated_at = :now WHERE id = :id AND clearance IS NULL',
        values,
      );
  }
}
