import { Injectable } from '@nestjs/common';

type CountDownloads = (orderId: string) => Promise<number>;

/** What higher rooms know about an order and the workshop's page of it shows; they fill it at start-up. */
@Injectable()
export class OrderFacts {
  private countDownloads: CountDownloads = () => Promise.resolve(0);

  registerDownloads(count: CountDownloads): void {
    this.countDownloads = count;
  }

  downloadsOf(orderId: string): Promise<number> {
    return this.countDownloads(orderId);
  }
}
