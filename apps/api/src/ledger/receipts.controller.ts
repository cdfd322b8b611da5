import { Readable } from 'node:stream';
import { Controller, StreamableFile } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import type { OrderRecord } from '../orders/order-record.js';
import { OrdersReader } from '../orders/orders-reader.js';
import { ExportReceipts } from './export-receipts.js';
import { ListReceipts } from './list-receipts.js';
import { ReceiptFiles, type ReceiptFile } from './receipt-files.js';

@Controller()
export class ReceiptsController {
  constructor(
    private readonly orders: OrdersReader,
    private readonly files: ReceiptFiles,
    private readonly listing: ListReceipts,
    private readonly exporting: ExportReceipts,
    private readonly limits: RateLimits,
  ) {}

  @Endpoint('GET /orders/:orderId/receipt.pdf')
  async ownReceipt(
    @Input() { params, query }: Handled<'GET /orders/:orderId/receipt.pdf'>,
    @MaybePerson() person: SignedIn | null,
  ): Promise<StreamableFile> {
    const order = await this.ownOrder(params.orderId, person, query.key);
    return asPdf(await this.files.receipt(order.id));
  }

  @Endpoint('GET /orders/:orderId/credit-notes/:creditNoteId.pdf')
  async ownCreditNote(
    @Input() { params, query }: Handled<'GET /orders/:orderId/credit-notes/:creditNoteId.pdf'>,
    @MaybePerson() person: SignedIn | null,
  ): Promise<StreamableFile> {
    const order = await this.ownOrder(params.orderId, person, query.key);
    return asPdf(await this.files.creditNote(order.id, params.creditNoteId));
  }

  @Endpoint('GET /workshop/orders/:orderId/receipt.pdf')
  async receipt(
    @Input() { params }: Handled<'GET /workshop/orders/:orderId/receipt.pdf'>,
  ): Promise<StreamableFile> {
    return asPdf(await this.files.receipt(params.orderId));
  }

  @Endpoint('GET /workshop/orders/:orderId/credit-notes/:creditNoteId.pdf')
  async creditNote(
    @Input() { params }: Handled<'GET /workshop/orders/:orderId/credit-notes/:creditNoteId.pdf'>,
  ): Promise<StreamableFile> {
    return asPdf(await this.files.creditNote(params.orderId, params.creditNoteId));
  }

  @Endpoint('GET /workshop/receipts')
  list(@Input() { query }: Handled<'GET /workshop/receipts'>): Promise<Answer<'GET /workshop/receipts'>> {
    return this.listing.page(query);
  }

  @Endpoint('GET /workshop/receipts.csv')
  export(@Input() { query }: Handled<'GET /workshop/receipts.csv'>): StreamableFile {
    return new StreamableFile(Readable.from(this.exporting.lines(query), { objectMode: false }), {
      type: 'text/csv; charset=utf-8',
      disposition: 'attachment; filename="receipts.csv"',
    });
  }

  private async ownOrder(
    orderId: string,
    person: SignedIn | null,
    key: string | undefined,
  ): Promise<OrderRecord> {
    const order = await this.orders.ofBuyer(orderId, person, key);
    await this.limits.take('papers', order.id);
    return order;
  }
}

const asPdf = ({ fileName, bytes }: ReceiptFile): StreamableFile =>
  new StreamableFile(bytes, {
    type: 'application/pdf',
    disposition: `inline; filename="${fileName}"`,
    length: bytes.length,
  });
