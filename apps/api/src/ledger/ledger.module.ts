import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { OrdersModule } from '../orders/orders.module.js';
import { SupportersModule } from '../supporters/supporters.module.js';
import { ExportOrders } from './export-orders.js';
import { ExportSupporters } from './export-supporters.js';
import { LedgerController } from './ledger.controller.js';
import { NumberSeries } from './number-series.js';
import { Receipt } from './receipt.model.js';
import { TaxRates } from './tax-rates.js';
import { WritePledgeReceipt } from './write-pledge-receipt.js';
import { WriteReceipt } from './write-receipt.js';

@Module({
  imports: [OrdersModule, SupportersModule, SequelizeModule.forFeature([Receipt])],
  controllers: [LedgerController],
  providers: [TaxRates, NumberSeries, WriteReceipt, WritePledgeReceipt, ExportOrders, ExportSupporters],
})
export class LedgerModule {}
