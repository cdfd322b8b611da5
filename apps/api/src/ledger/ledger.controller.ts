import { Readable } from 'node:stream';
import { Controller, StreamableFile } from '@nestjs/common';
import type { Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ExportOrders } from './export-orders.js';
import { ExportSupporters } from './export-supporters.js';

@Controller()
export class LedgerController {
  constructor(
    private readonly orders: ExportOrders,
    private readonly supporters: ExportSupporters,
  ) {}

  @Endpoint('GET /workshop/orders.csv')
  exportOrders(@Input() { query }: Handled<'GET /workshop/orders.csv'>): StreamableFile {
    return new StreamableFile(Readable.from(this.orders.lines(query), { objectMode: false }), {
      type: 'text/csv; charset=utf-8',
      disposition: 'attachment; filename="orders.csv"',
    });
  }

  @Endpoint('GET /workshop/supporters.csv')
  exportSupporters(@Input() { query }: Handled<'GET /workshop/supporters.csv'>): StreamableFile {
    return new StreamableFile(Readable.from(this.supporters.lines(query), { objectMode: false }), {
      type: 'text/csv; charset=utf-8',
      disposition: 'attachment; filename="supporters.csv"',
    });
  }
}
