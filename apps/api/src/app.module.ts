import { Module } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { AccountsModule } from './accounts/accounts.module.js';
import { AdaptersModule } from './adapters/adapters.module.js';
import { CatalogueModule } from './catalogue/catalogue.module.js';
import { ConfigModule } from './config/config.module.js';
import { CouponsModule } from './coupons/coupons.module.js';
import { DatabaseModule } from './database/database.module.js';
import { EntitlementsModule } from './entitlements/entitlements.module.js';
import { FitModule } from './fit/fit.module.js';
import { HttpModule } from './http/http.module.js';
import { JobsModule } from './jobs/jobs.module.js';
import { JournalModule } from './journal/journal.module.js';
import { LedgerModule } from './ledger/ledger.module.js';
import { LettersModule } from './letters/letters.module.js';
import { MailsModule } from './mails/mails.module.js';
import { MeasuringModule } from './measuring/measuring.module.js';
import { PicturesModule } from './pictures/pictures.module.js';
import { OrdersModule } from './orders/orders.module.js';
import { PaymentsModule } from './payments/payments.module.js';
import { SupportersModule } from './supporters/supporters.module.js';
import { WorkshopModule } from './workshop/workshop.module.js';

@Module({
  imports: [
    ConfigModule,
    DatabaseModule,
    AdaptersModule,
    HttpModule,
    JobsModule,
    MailsModule,
    PaymentsModule,
    PicturesModule,
    ScheduleModule.forRoot(),
    // The rooms, lower ones first.
    AccountsModule,
    CatalogueModule,
    MeasuringModule,
    CouponsModule,
    OrdersModule,
    SupportersModule,
    LedgerModule,
    EntitlementsModule,
    FitModule,
    LettersModule,
    JournalModule,
    WorkshopModule,
  ],
})
export class AppModule {}
