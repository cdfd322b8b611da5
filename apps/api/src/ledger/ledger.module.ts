import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { OrdersModule } from '../orders/orders.module.js';
import { SupportersModule } from '../supporters/supporters.module.js';
import { BooksController } from './books/books.controller.js';
import { LedgerExport } from './books/ledger-export.model.js';
import { ListPayments } from './books/list-payments.js';
import { ListSales } from './books/list-sales.js';
import { Movements } from './books/movements.js';
import { ReconcileBooks } from './books/reconcile-books.js';
import { Reconciliation } from './books/reconciliation.model.js';
import { Reconciliations } from './books/reconciliations.js';
import { WriteYearExport } from './books/write-year-export.js';
import { YearExports } from './books/year-exports.js';
import { YearFiles } from './books/year-files.js';
import { CreditNote } from './credit-note.model.js';
import { ExportOrders } from './export-orders.js';
import { ExportReceipts } from './export-receipts.js';
import { ExportSupporters } from './export-supporters.js';
import { LedgerController } from './ledger.controller.js';
import { ListReceipts } from './list-receipts.js';
import { NumberSeries } from './number-series.js';
import { ReceiptFiles } from './receipt-files.js';
import { Receipt } from './receipt.model.js';
import { ReceiptsController } from './receipts.controller.js';
import { ChangeRates } from './tax/change-rates.js';
import { CloseQuarter } from './tax/close-quarter.js';
import { ExportSummary } from './tax/export-summary.js';
import { ListLocations } from './tax/list-locations.js';
import { ListQuarters } from './tax/list-quarters.js';
import { ListRates } from './tax/list-rates.js';
import { QuarterPortions } from './tax/quarter-portions.js';
import { SettleLocation } from './tax/settle-location.js';
import { SummariseQuarter } from './tax/summarise-quarter.js';
import { TaxQuarters } from './tax/tax-quarters.js';
import { TaxController } from './tax/tax.controller.js';
import { TaxRates } from './tax-rates.js';
import { WriteCreditNote } from './write-credit-note.js';
import { WritePledgeReceipt } from './write-pledge-receipt.js';
import { WriteReceipt } from './write-receipt.js';

@Module({
  imports: [
    AccountsModule,
    OrdersModule,
    SupportersModule,
    SequelizeModule.forFeature([Receipt, CreditNote, LedgerExport, Reconciliation]),
  ],
  controllers: [LedgerController, ReceiptsController, TaxController, BooksController],
  providers: [
    TaxRates,
    NumberSeries,
    WriteReceipt,
    WritePledgeReceipt,
    WriteCreditNote,
    ReceiptFiles,
    ListReceipts,
    ExportOrders,
    ExportReceipts,
    ExportSupporters,
    ListRates,
    ChangeRates,
    TaxQuarters,
    QuarterPortions,
    SummariseQuarter,
    ListQuarters,
    CloseQuarter,
    ExportSummary,
    ListLocations,
    SettleLocation,
    ListSales,
    Movements,
    ListPayments,
    YearFiles,
    YearExports,
    WriteYearExport,
    Reconciliations,
    ReconcileBooks,
  ],
})
export class LedgerModule {}
