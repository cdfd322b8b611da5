import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { OrdersModule } from '../orders/orders.module.js';
import { CreditNote } from './credit-note.model.js';
import { ExportOrders } from './export-orders.js';
import { ExportReceipts } from './export-receipts.js';
import { LedgerController } from './ledger.controller.js';
import { ListReceipts } from './list-receipts.js';
import { NumberSeries } from './number-series.js';
import { ReceiptFiles } from './receipt-files.js';
import { Receipt } from './receipt.model.js';
import { ReceiptsController } from './receipts.controller.js';
import { TaxRates } from './tax-rates.js';
import { WriteCreditNote } from './write-credit-note.js';
import { WriteReceipt } from './write-receipt.js';

@Module({
  imports: [OrdersModule, SequelizeModule.forFeature([Receipt, CreditNote])],
  controllers: [LedgerController, ReceiptsController],
  providers: [
    TaxRates,
    NumberSeries,
    WriteReceipt,
    WriteCreditNote,
    ReceiptFiles,
    ListReceipts,
    ExportOrders,
    ExportReceipts,
  ],
})
export class LedgerModule {}
