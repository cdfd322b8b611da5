import { Global, Module, type OnApplicationShutdown } from '@nestjs/common';
import { CONFIG, type Config } from '../config/config.js';
import { Clock } from './clock/clock.js';
import { Mailer } from './mailer/mailer.js';
import { SmtpMailer } from './mailer/smtp-mailer.js';
import { Invoices } from './payments/invoices.js';
import { Payments } from './payments/payments.js';
import { PaymentBalance } from './payments/reconciliation.js';
import { StripeBalance } from './payments/stripe-balance.js';
import { StripeInvoices } from './payments/stripe-invoices.js';
import { StripePayments } from './payments/stripe-payments.js';
import { StripeSubscriptions } from './payments/stripe-subscriptions.js';
import { Subscriptions } from './payments/subscriptions.js';
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
    {
      provide: Subscriptions,
      inject: [CONFIG],
      useFactory: (config: Config) => new StripeSubscriptions(config),
    },
    { provide: Invoices, inject: [CONFIG], useFactory: (config: Config) => new StripeInvoices(config) },
    { provide: PaymentBalance, inject: [CONFIG], useFactory: (config: Config) => new StripeBalance(config) },
  ],
  exports: [Clock, LinkTokens, Storage, Mailer, Payments, Subscriptions, Invoices, PaymentBalance],
})
export class AdaptersModule implements OnApplicationShutdown {
  constructor(private readonly mailer: Mailer) {}

  onApplicationShutdown(): Promise<void> {
    return this.mailer.close();
  }
}
