import { Readable } from 'node:stream';
import { Controller, StreamableFile } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { ListPayments } from './list-payments.js';
import { ListSales } from './list-sales.js';
import { Reconciliations } from './reconciliations.js';
import { YearExports } from './year-exports.js';

@Controller()
export class BooksController {
  constructor(
    private readonly sales: ListSales,
    private readonly payments: ListPayments,
    private readonly exports: YearExports,
    private readonly reconciliations: Reconciliations,
  ) {}

  @Endpoint('GET /workshop/ledger/sales')
  figures(
    @Input() { query }: Handled<'GET /workshop/ledger/sales'>,
  ): Promise<Answer<'GET /workshop/ledger/sales'>> {
    return this.sales.figures(query.months);
  }

  @Endpoint('GET /workshop/ledger/payments')
  listPayments(
    @Input() { query }: Handled<'GET /workshop/ledger/payments'>,
  ): Promise<Answer<'GET /workshop/ledger/payments'>> {
    return this.payments.page(query);
  }

  @Endpoint('GET /workshop/ledger/payments.csv')
  exportPayments(@Input() { query }: Handled<'GET /workshop/ledger/payments.csv'>): StreamableFile {
    return new StreamableFile(Readable.from(this.payments.lines(query), { objectMode: false }), {
      type: 'text/csv; charset=utf-8',
      disposition: 'attachment; filename="payments.csv"',
    });
  }

  @Endpoint('GET /workshop/ledger/exports')
  listExports(
    @Input() { query }: Handled<'GET /workshop/ledger/exports'>,
  ): Promise<Answer<'GET /workshop/ledger/exports'>> {
    return this.exports.page(query);
  }

  @Endpoint('POST /workshop/ledger/exports')
  askForExport(
    @Input() { body }: Handled<'POST /workshop/ledger/exports'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'POST /workshop/ledger/exports'>> {
    return this.exports.ask(body.year, person);
  }

  @Endpoint('GET /workshop/ledger/exports/:exportId')
  readExport(
    @Input() { params }: Handled<'GET /workshop/ledger/exports/:exportId'>,
  ): Promise<Answer<'GET /workshop/ledger/exports/:exportId'>> {
    return this.exports.one(params.exportId);
  }

  @Endpoint('GET /workshop/ledger/exports/:exportId/file')
  async exportFile(
    @Input() { params }: Handled<'GET /workshop/ledger/exports/:exportId/file'>,
  ): Promise<StreamableFile> {
    const { fileName, bytes, stream } = await this.exports.file(params.exportId);
    return new StreamableFile(stream, {
      type: 'application/zip',
      disposition: `attachment; filename="${fileName}"`,
      length: bytes,
    });
  }

  @Endpoint('GET /workshop/ledger/reconciliations')
  listReconciliations(
    @Input() { query }: Handled<'GET /workshop/ledger/reconciliations'>,
  ): Promise<Answer<'GET /workshop/ledger/reconciliations'>> {
    return this.reconciliations.page(query);
  }

  @Endpoint('POST /workshop/ledger/reconciliations')
  reconcile(
    @Input() { body }: Handled<'POST /workshop/ledger/reconciliations'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'POST /workshop/ledger/reconciliations'>> {
    return this.reconciliations.ask(body, person);
  }

  @Endpoint('GET /workshop/ledger/reconciliations/:reconciliationId')
  readReconciliation(
    @Input() { params }: Handled<'GET /workshop/ledger/reconciliations/:reconciliationId'>,
  ): Promise<Answer<'GET /workshop/ledger/reconciliations/:reconciliationId'>> {
    return this.reconciliations.one(params.reconciliationId);
  }

  @Endpoint('GET /workshop/ledger/reconciliations/:reconciliationId/rows')
  reconciliationRows(
    @Input() input: Handled<'GET /workshop/ledger/reconciliations/:reconciliationId/rows'>,
  ): Promise<Answer<'GET /workshop/ledger/reconciliations/:reconciliationId/rows'>> {
    return this.reconciliations.rows(input);
  }
}
