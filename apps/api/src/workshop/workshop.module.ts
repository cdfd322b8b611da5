import { Module } from '@nestjs/common';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { CouponsModule } from '../coupons/coupons.module.js';
import { FitModule } from '../fit/fit.module.js';
import { LettersModule } from '../letters/letters.module.js';
import { OrdersModule } from '../orders/orders.module.js';
import { Overviews } from './overview.js';
import { WorkshopController } from './workshop.controller.js';

@Module({
  imports: [CatalogueModule, CouponsModule, FitModule, LettersModule, OrdersModule],
  controllers: [WorkshopController],
  providers: [Overviews],
})
export class WorkshopModule {}
