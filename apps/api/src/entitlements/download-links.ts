import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens, tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { notFound } from '../http/refusal.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { DownloadLink } from './download-link.model.js';
import { Entitlement } from './entitlement.model.js';

export type LinkState = 'open' | 'expired' | 'used-up' | 'replaced';

/** Mailed links to an order's files: they open a page, expire, have a number of uses, and can be replaced. */
@Injectable()
export class DownloadLinks {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(DownloadLink) private readonly links: typeof DownloadLink,
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    @InjectConfig() private readonly config: Config,
    private readonly tokens: LinkTokens,
    private readonly catalogue: CatalogueReader,
    private readonly mails: MailOutbox,
    private readonly clock: Clock,
  ) {}

  /** @returns the row's id, from which the secret is derived when the e-mail goes out */
  async issue(tx: Tx, orderId: string, email: string): Promise<string> {
    const id = newId();
    await this.links.create(
      {
        id,
        orderId,
        email,
        tokenHash: this.tokens.hashOf(this.tokens.tokenOf('collect', id)),
        expiresAt: this.clock.in(this.config.LINK_DAYS * 86_400),
        usesLeft: this.config.LINK_USES,
        createdAt: this.clock.now(),
      },
      { transaction: tx },
    );
    return id;
  }

  /** Ends an order's earlier links and mails a new one to the address that holds the rights, never to another. */
  async replace(tx: Tx, orderId: string, email: string): Promise<void> {
    const active = await this.entitlements.findAll({ where: { orderId, state: 'active' }, transaction: tx });
    if (active.length === 0) return;
    await this.links.update(
      { replacedAt: this.clock.now() },
      { where: { orderId, replacedAt: null }, transaction: tx },
    );
    const linkId = await this.issue(tx, orderId, email);
    const kits = await this.catalogue.kitsByIds([...new Set(active.map((one) => one.kitId))]);
    await this.mails.add(tx, {
      to: email,
      key: `new-link:${linkId}`,
      about: `order:${orderId}`,
      message: {
        template: 'new-download-link',
        link: `${this.config.BASE_URL}/collect/${tokenPlaceholder('collect', linkId)}`,
        linkDays: this.config.LINK_DAYS,
        linkUses: this.config.LINK_USES,
        kits: kits.map((kit) => kit.name),
      },
    });
  }

  /** @throws Refusal `not-found` */
  async byToken(token: string): Promise<DownloadLink> {
    const link = await this.links.findOne({ where: { tokenHash: this.tokens.hashOf(token) } });
    if (!link) throw notFound('link');
    return link;
  }

  stateOf(link: DownloadLink): LinkState {
    if (link.replacedAt) return 'replaced';
    if (link.expiresAt <= this.clock.now()) return 'expired';
    return link.usesLeft > 0 ? 'open' : 'used-up';
  }

  /** Takes one use, if one is left; two at the same moment cannot take the same. */
  async takeUse(tx: Tx, linkId: string): Promise<boolean> {
    const taken = await touchRows(
      this.database,
      'UPDATE download_links SET uses_left = uses_left - 1 WHERE id = :linkId AND uses_left > 0 AND replaced_at IS NULL AND expires_at > :now',
      { linkId, now: this.clock.now() },
      tx,
    );
    return taken === 1;
  }
}
