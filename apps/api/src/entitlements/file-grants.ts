import { createHash, randomBytes } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Clearance } from '@windchest/contracts';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader, type ReleasedRevision } from '../catalogue/catalogue-reader.js';
import { InjectConfig, type Config } from '../config/config.js';
import { newId } from '../database/columns.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { DownloadLinks } from './download-links.js';
import { Download } from './download.model.js';
import { Entitlement } from './entitlement.model.js';
import { mayDownload, type DownloadDecision } from './may-download.js';
import { SignedAddress, type AddressFacts } from './signed-address.js';

export type Wish = {
  kitSlug: string;
  revisionId: string;
  file?: string | undefined;
  clearance?: Clearance | undefined;
};
type Grant = Answer<'POST /shelf/grants'>;

/** The hash under which a browser's own cookie is written into an address. */
export const browserMark = (cookie: string): string =>
  createHash('sha256').update(cookie).digest('base64url');

/** Decides on a download and gives out its signed address. */
@Injectable()
export class FileGrants {
  constructor(
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    @InjectModel(Download) private readonly downloads: typeof Download,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly links: DownloadLinks,
    private readonly addresses: SignedAddress,
    private readonly clock: Clock,
  ) {}

  async forPerson(person: SignedIn, wish: Wish): Promise<Grant> {
    const mine = await this.entitlements.findAll({ where: { personId: person.id } });
    const { entitlementId, file } = await this.decide(wish, mine);
    return this.transactions.run((tx) =>
      this.give(tx, wish, entitlementId, file, null, { person: person.id }),
    );
  }

  /** By a mailed link: takes one use. @returns the grant and the cookie its browser must keep */
  async forLink(
    token: string,
    wish: Wish,
    cookie: string | undefined,
  ): Promise<{ grant: Grant; cookie: string }> {
    const link = await this.links.byToken(token);
    const state = this.links.stateOf(link);
    if (state !== 'open') throw closedLink(state);
    const ofOrder = await this.entitlements.findAll({ where: { orderId: link.orderId } });
    const { entitlementId, file } = await this.decide(wish, ofOrder);
    const browser = cookie ?? randomBytes(32).toString('base64url');
    const grant = await this.transactions.run(async (tx) => {
      if (!(await this.links.takeUse(tx, link.id))) throw closedLink('used-up');
      return this.give(tx, wish, entitlementId, file, link.id, { browser: browserMark(browser) });
    });
    return { grant, cookie: browser };
  }

  private async decide(
    wish: Wish,
    entitlements: readonly Entitlement[],
  ): Promise<{ entitlementId: string; file: FileFacts }> {
    const kit = await this.catalogue.kitBySlug(wish.kitSlug);
    const revision =
      kit && (await this.catalogue.revisionsOf(kit.id)).find((one) => one.id === wish.revisionId);
    if (!kit || !revision) throw notFound('kit or revision');
    const decision = mayDownload({
      kitId: kit.id,
      revision: {
        kitId: kit.id,
        releasedAt: revision.releasedAt,
        isReleased: true,
        isWithdrawn: revision.isWithdrawn,
      },
      entitlements,
    });
    if (!decision.isAllowed)
      throw decision.why === 'withdrawn' ? withdrawnRefusal(revision) : downloadRefusal(decision.why);
    const file = wish.file
      ? await this.catalogue.fileOf(revision.id, wish.file)
      : await this.catalogue.bundleFile(revision.id, wish.clearance);
    if (!file && !wish.file && wish.clearance) throw noSuchClearance(revision.label);
    if (!file) throw notFound('file');
    return { entitlementId: decision.entitlementId, file };
  }

  private async give(
    tx: Tx,
    wish: Wish,
    entitlementId: string,
    file: FileFacts,
    linkId: string | null,
    boundTo: AddressFacts['boundTo'],
  ): Promise<Grant> {
    const downloadId = newId();
    await this.downloads.create(
      {
        id: downloadId,
        entitlementId,
        revisionId: wish.revisionId,
        linkId,
        sha256: file.sha256,
        fileName: file.fileName,
        bytes: file.bytes,
        isBundle: !wish.file,
        grantedAt: this.clock.now(),
      },
      { transaction: tx },
    );
    const expiresAt = this.clock.in(this.config.FILE_ADDRESS_MINUTES * 60);
    const address = this.addresses.write({
      downloadId,
      expires: Math.floor(expiresAt.getTime() / 1000),
      boundTo,
    });
    return {
      url: `/api/files/${address}`,
      expiresAt: expiresAt.toISOString(),
      fileName: file.fileName,
      bytes: file.bytes,
      sha256: file.sha256,
    };
  }
}

interface FileFacts {
  sha256: string;
  bytes: number;
  fileName: string;
}

export const withdrawnRefusal = ({ label, withdrawnReason }: ReleasedRevision): Refusal =>
  new Refusal('forbidden', `The workshop has withdrawn ${label}: ${withdrawnReason ?? ''}`.trim());

type Why = Exclude<Extract<DownloadDecision, { isAllowed: false }>['why'], 'withdrawn'>;
const sentences: Record<Why, string> = {
  'not-entitled': 'This kit is not on your shelf.',
  suspended: 'Downloads of this kit rest while its payment is in dispute.',
  ended: 'The right to this kit’s files has ended, for it was refunded.',
  'pledge-rests': 'This kit is on your shelf by your pledge, and the pledge rests now.',
  'pledge-ended': 'This kit was on your shelf by your pledge, and the pledge has ended.',
  'outside-pledge':
    'Your pledge has ended. What stays of it are the revisions on your shelf; this one is not among them.',
  'not-released': 'This revision is not released.',
};
/** Why no file goes out, in a sentence. */
export const downloadRefusal = (why: keyof typeof sentences): Refusal =>
  new Refusal(why === 'not-entitled' ? 'not-found' : 'forbidden', sentences[why]);

const noSuchClearance = (label: string): Refusal =>
  new Refusal('not-found', `${label} has no bundle of that clearance. Take its whole bundle.`);

const closedLink = (state: 'expired' | 'used-up' | 'replaced'): Refusal =>
  state === 'expired'
    ? new Refusal('link-has-expired', 'This link has expired. Ask for a fresh one below.')
    : new Refusal(
        'link-is-used-up',
        state === 'replaced'
          ? 'A newer link has replaced this one. Look for it in your mail, or ask for another.'
          : 'This link has been used as often as it may be. Ask for a fresh one below.',
      );
