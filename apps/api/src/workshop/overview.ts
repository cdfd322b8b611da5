import { Injectable } from '@nestjs/common';
import { may, type Answer } from '@windchest/contracts';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueWaiting } from '../catalogue/catalogue-waiting.js';
import { InjectConfig, type Config } from '../config/config.js';
import { CouponsReader } from '../coupons/coupons-reader.js';
import { ListFitReports } from '../fit/list-fit-reports.js';
import type { SignedIn } from '../http/person.js';
import { JobQueue } from '../jobs/job-queue.js';
import { ShowLetters } from '../letters/show-letters.js';
import { OrdersReader } from '../orders/orders-reader.js';

type Overview = Answer<'GET /workshop/overview'>;
type Waiting = Overview['waiting'];

const DAYS = 30;
const DAY_MS = 86_400_000;
/** What waits for a member of staff, and the sales of the last thirty days for those who see money. */
@Injectable()
export class Overviews {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly catalogue: CatalogueWaiting,
    private readonly coupons: CouponsReader,
    private readonly orders: OrdersReader,
    private readonly fit: ListFitReports,
    private readonly letters: ShowLetters,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  async read(person: SignedIn): Promise<Overview> {
    const seesMoney = may(person.role, 'orders:read');
    const waiting = await Promise.all([
      may(person.role, 'revisions:write') ? this.drafts() : [],
      seesMoney ? this.flaggedOrders() : [],
      may(person.role, 'coupons:read') ? this.lowCoupons() : [],
      may(person.role, 'fit:read') ? this.fitReports() : [],
      may(person.role, 'letters:read') ? this.lettersUnderWay() : [],
      person.role === 'owner' ? this.deadJobs() : [],
    ]);
    return { sales: seesMoney ? await this.sales() : null, waiting: waiting.flat() };
  }

  private async drafts(): Promise<Waiting> {
    const drafts = await this.catalogue.drafts();
    return drafts.flatMap((draft) => {
      const link = `/workshop/kits/${draft.kitId}/revisions/${draft.revisionId}`;
      const refused =
        draft.refusedFiles > 0
          ? [
              {
                kind: 'refused-file' as const,
                label: draft.label,
                count: draft.refusedFiles,
                link: `${link}/files`,
              },
            ]
          : [];
      return [{ kind: 'draft' as const, label: draft.label, count: 1, link }, ...refused];
    });
  }

  private async flaggedOrders(): Promise<Waiting> {
    const count = await this.orders.countFlagged();
    return count > 0 ? [{ kind: 'flagged-order', label: '', count, link: '/workshop/orders?flagged=1' }] : [];
  }

  private async lowCoupons(): Promise<Waiting> {
    const low = await this.coupons.nearlyUsedUp();
    return low.map(({ id, code, left }) => ({
      kind: 'coupon-low',
      label: code,
      count: left,
      link: `/workshop/coupons/${id}`,
    }));
  }

  private async fitReports(): Promise<Waiting> {
    const count = await this.fit.countNew();
    return count > 0 ? [{ kind: 'fit-report', label: '', count, link: '/workshop/fit?state=new' }] : [];
  }

  private async lettersUnderWay(): Promise<Waiting> {
    const letters = await this.letters.underWay();
    return letters.map(({ id, subject }) => ({
      kind: 'letter',
      label: subject,
      count: 1,
      link: `/workshop/letters/${id}`,
    }));
  }

  private async deadJobs(): Promise<Waiting> {
    const count = await this.jobs.countDead();
    return count > 0 ? [{ kind: 'dead-job', label: '', count, link: '/workshop/log' }] : [];
  }

  private async sales(): Promise<NonNullable<Overview['sales']>> {
    const today = Math.floor(this.clock.now().getTime() / DAY_MS);
    const sold = new Map(
      (await this.orders.salesByDay(new Date((today - DAYS + 1) * DAY_MS))).map((day) => [day.day, day]),
    );
    return Array.from({ length: DAYS }, (_, index) => {
      const day = new Date((today - DAYS + 1 + index) * DAY_MS).toISOString().slice(0, 10);
      const found = sold.get(day);
      return {
        day,
        orders: found?.orders ?? 0,
        gross: { minor: found?.grossMinor ?? 0, currency: this.config.WORKSHOP_CURRENCY },
      };
    });
  }
}
