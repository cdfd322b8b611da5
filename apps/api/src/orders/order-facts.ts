import { Injectable } from '@nestjs/common';

type CountDownloads = (orderId: string) => Promise<number>;
export type Right = 'active' | 'suspended' | 'ended';
/** How the rights that lines gave stand, by the line's id. */
type ReadRights = (orderIds: readonly string[]) => Promise<ReadonlyMap<string, Right>>;

/** What higher rooms know about orders and the pages of orders show; they fill it at start-up. */
@Injectable()
export class OrderFacts {
  private countDownloads: CountDownloads = () => Promise.resolve(0);
  private readRights: ReadRights = () => Promise.resolve(new Map());

  registerDownloads(count: CountDownloads): void {
    this.countDownloads = count;
  }

  downloadsOf(orderId: string): Promise<number> {
    return this.countDownloads(orderId);
  }

  registerRights(read: ReadRights): void {
    this.readRights = read;
  }

  rightsOf(orderIds: readonly string[]): Promise<ReadonlyMap<string, Right>> {
    return this.readRights(orderIds);
  }
}
