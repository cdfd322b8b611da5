import { Controller, StreamableFile } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../../http/person.js';
import { ChangeRates } from './change-rates.js';
import { CloseQuarter } from './close-quarter.js';
import { ExportSummary } from './export-summary.js';
import { ListLocations } from './list-locations.js';
import { ListQuarters } from './list-quarters.js';
import { ListRates } from './list-rates.js';
import { SettleLocation } from './settle-location.js';
import { SummariseQuarter } from './summarise-quarter.js';

@Controller()
export class TaxController {
  constructor(
    private readonly rates: ListRates,
    private readonly changing: ChangeRates,
    private readonly quarters: ListQuarters,
    private readonly summaries: SummariseQuarter,
    private readonly summaryFile: ExportSummary,
    private readonly closing: CloseQuarter,
    private readonly locations: ListLocations,
    private readonly settling: SettleLocation,
  ) {}

  @Endpoint('GET /workshop/ledger/rates')
  listRates(
    @Input() { query }: Handled<'GET /workshop/ledger/rates'>,
  ): Promise<Answer<'GET /workshop/ledger/rates'>> {
    return this.rates.page(query);
  }

  @Endpoint('GET /workshop/ledger/rates/missing')
  missingRates(): Promise<Answer<'GET /workshop/ledger/rates/missing'>> {
    return this.rates.missing();
  }

  @Endpoint('GET /workshop/ledger/rates/changes')
  rateChanges(
    @Input() { query }: Handled<'GET /workshop/ledger/rates/changes'>,
  ): Promise<Answer<'GET /workshop/ledger/rates/changes'>> {
    return this.changing.changes(query);
  }

  @Endpoint('POST /workshop/ledger/rates')
  enterRate(
    @Input() { body }: Handled<'POST /workshop/ledger/rates'>,
    @ThisPerson() person: SignedIn,
  ): Promise<void> {
    return this.changing.enter(body, person);
  }

  @Endpoint('DELETE /workshop/ledger/rates/:country/:kind/:validFrom')
  takeBackRate(
    @Input() { params }: Handled<'DELETE /workshop/ledger/rates/:country/:kind/:validFrom'>,
    @ThisPerson() person: SignedIn,
  ): Promise<void> {
    return this.changing.takeBack(params, person);
  }

  @Endpoint('GET /workshop/ledger/quarters')
  listQuarters(
    @Input() { query }: Handled<'GET /workshop/ledger/quarters'>,
  ): Promise<Answer<'GET /workshop/ledger/quarters'>> {
    return this.quarters.page(query);
  }

  @Endpoint('GET /workshop/ledger/quarters/:year/:quarter')
  summary(
    @Input() { params }: Handled<'GET /workshop/ledger/quarters/:year/:quarter'>,
  ): Promise<Answer<'GET /workshop/ledger/quarters/:year/:quarter'>> {
    return this.summaries.summarise(params);
  }

  @Endpoint('GET /workshop/ledger/quarters/:year/:quarter/summary.csv')
  async summaryCsv(
    @Input() { params }: Handled<'GET /workshop/ledger/quarters/:year/:quarter/summary.csv'>,
  ): Promise<StreamableFile> {
    return new StreamableFile(Buffer.from(await this.summaryFile.text(params)), {
      type: 'text/csv; charset=utf-8',
      disposition: `attachment; filename="tax-${params.year}-q${params.quarter}.csv"`,
    });
  }

  @Endpoint('POST /workshop/ledger/quarters/:year/:quarter/close')
  close(
    @Input() { params }: Handled<'POST /workshop/ledger/quarters/:year/:quarter/close'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'POST /workshop/ledger/quarters/:year/:quarter/close'>> {
    return this.closing.close(params, person);
  }

  @Endpoint('GET /workshop/ledger/locations')
  listLocations(
    @Input() { query }: Handled<'GET /workshop/ledger/locations'>,
  ): Promise<Answer<'GET /workshop/ledger/locations'>> {
    return this.locations.page(query);
  }

  @Endpoint('GET /workshop/ledger/locations/:receiptId')
  location(
    @Input() { params }: Handled<'GET /workshop/ledger/locations/:receiptId'>,
  ): Promise<Answer<'GET /workshop/ledger/locations/:receiptId'>> {
    return this.locations.one(params.receiptId);
  }

  @Endpoint('POST /workshop/ledger/locations/:receiptId')
  async settle(
    @Input() { params, body }: Handled<'POST /workshop/ledger/locations/:receiptId'>,
    @ThisPerson() person: SignedIn,
  ): Promise<Answer<'POST /workshop/ledger/locations/:receiptId'>> {
    await this.settling.settle(params.receiptId, body, person);
    return this.locations.one(params.receiptId);
  }
}
