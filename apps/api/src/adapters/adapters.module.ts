import { Global, Module, type OnApplicationShutdown } from '@nestjs/common';
import { CONFIG, type Config } from '../config/config.js';
import { Clock } from './clock/clock.js';
import { Mailer } from './mailer/mailer.js';
import { SmtpMailer } from './mailer/smtp-mailer.js';
import { Payments } from './payments/payments.js';
import { StripePayments } from './payments/stripe-payments.js';
import { LinkTokens } from './secrets/link-tokens.js';
import { LocalDiskStorage } from './storage/local-disk.js';
import { Storage } from './storage/storage.js';

/** The outside world behind small interfaces. */
@Global()
@Module({
  providers: [
    Clock,
    LinkTokens,
    {
      provide: Storage,
      inject: [CONFIG],
      useFactory: (config: Config) => new LocalDiskStorage(config.FILES_DIR),
    },
    {
      provide: Mailer,
      inject: [CONFIG],
      useFactory: (config: Config) => new SmtpMailer(config.SMTP_URL, config.MAIL_FROM),
    },
    { provide: Payments, inject: [CONFIG], useFactory: (config: Config) => new StripePayments(config) },
  ],
  exports: [Clock, LinkTokens, Storage, Mailer, Payments],
})
export class AdaptersModule implements OnApplicationShutdown {
  constructor(private readonly mailer: Mailer) {}

  onApplicationShutdown(): Promise<void> {
    return this.mailer.close();
  }
}
