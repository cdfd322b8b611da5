import { Module } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { AccountsModule } from './accounts/accounts.module.js';
import { AdaptersModule } from './adapters/adapters.module.js';
import { ConfigModule } from './config/config.module.js';
import { DatabaseModule } from './database/database.module.js';
import { HttpModule } from './http/http.module.js';
import { JobsModule } from './jobs/jobs.module.js';
import { MailsModule } from './mails/mails.module.js';

@Module({
  imports: [
    ConfigModule,
    DatabaseModule,
    AdaptersModule,
    HttpModule,
    JobsModule,
    MailsModule,
    ScheduleModule.forRoot(),
    // The rooms, lower ones first.
    AccountsModule,
  ],
})
export class AppModule {}
