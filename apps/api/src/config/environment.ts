import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65535);
const secret = z.string().min(32, 'at least 32 characters');
const flag = z
  .enum(['0', '1'])
  .default('0')
  .transform((value) => value === '1');

/** Every setting of the API. At start-up all bad ones are named at once; no value is ever printed. */
export const environmentSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: port.default(4600),
  BASE_URL: z.url(),
  TRUST_PROXY: z.string().default('loopback'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),

  DB_HOST: z.string().default('127.0.0.1'),
  DB_PORT: port.default(3306),
  DB_NAME: z.string().min(1),
  DB_USER: z.string().min(1),
  DB_PASSWORD: z.string(),
  DB_POOL: z.coerce.number().int().min(2).max(200).default(20),

  SESSION_SECRET: secret,
  /** Mailed links and signed file addresses are derived from it. */
  LINK_SECRET: secret,

  FILES_DIR: z.string().min(1),
  WEB_DIST: z.string().optional(),
  /** Where a web server in front finds FILES_DIR for `X-Accel-Redirect`, e.g. `/protected-files/`. */
  ACCEL_PREFIX: z
    .string()
    .regex(/^\/.*\/$/, 'starts and ends with a slash')
    .optional(),
  MAX_FILE_BYTES: z.coerce
    .number()
    .int()
    .positive()
    .default(512 * 1024 ** 2),
  MAX_REVISION_BYTES: z.coerce
    .number()
    .int()
    .positive()
    .default(4 * 1024 ** 3),

  SMTP_URL: z.url(),
  MAIL_FROM: z.string().min(3),

  /** Where mail servers send their reports; each letter's return path carries its recipient behind a plus. */
  BOUNCE_ADDRESS: z.email().optional(),
  /** Signs the reports that the mail server hands to `POST /api/mails/bounces`. */
  BOUNCE_SECRET: secret.optional(),
  /** Mails of a letter in a minute, unless the letter says otherwise. */
  LETTERS_PER_MINUTE: z.coerce.number().int().min(1).max(100_000).default(300),

  STRIPE_KEY: z.string().min(8),
  STRIPE_WEBHOOK_SECRET: z.string().min(8),
  STRIPE_HOST: z.string().optional(),
  STRIPE_PORT: port.optional(),
  STRIPE_PROTOCOL: z.enum(['http', 'https']).default('https'),
  /** How long a payment page stays open; the payment service asks for 30 minutes or more. */
  CHECKOUT_MINUTES: z.coerce.number().min(0.05).max(1440).default(30),

  WORKSHOP_NAME: z.string().min(1).default('Saltmarsh Sound Works'),
  WORKSHOP_CURRENCY: z
    .string()
    .regex(/^[A-Z]{3}$/)
    .default('EUR'),
  WORKSHOP_COUNTRY: z
    .string()
    .regex(/^[A-Z]{2}$/)
    .default('IE'),
  WORKSHOP_ADDRESS: z.string().default(''),
  /** Who sells, by the full name that receipts must carry; the workshop's name where it is the same. */
  WORKSHOP_SELLER: z.string().max(160).default(''),
  WORKSHOP_VAT_NUMBER: z
    .string()
    .regex(/^([A-Z]{2}[A-Z0-9+*]{2,13})?$/, 'begins with the country, IE1234567X, without spaces')
    .default(''),
  /** Above it a receipt carries the buyer's name and address; in whole units of the workshop's currency. */
  SIMPLE_RECEIPT_UP_TO: z.coerce.number().int().min(0).max(1_000_000).default(100),
  WORKSHOP_LOCALE: z.string().default('en-IE'),
  SECURITY_CONTACT: z.string().optional(),

  LINK_DAYS: z.coerce.number().int().min(1).max(365).default(14),
  LINK_USES: z.coerce.number().int().min(1).max(1000).default(10),
  /** How long a supporter's shelf stays as it is while a payment is open. */
  PLEDGE_GRACE_DAYS: z.coerce.number().min(1).max(60).default(7),
  FILE_ADDRESS_MINUTES: z.coerce.number().min(1).max(1440).default(60),

  JOB_POLL_MS: z.coerce.number().int().min(10).max(60_000).default(500),
  JOB_LEASE_SECONDS: z.coerce.number().min(1).max(3600).default(60),
  JOB_CONCURRENCY: z.coerce.number().int().min(0).max(64).default(4),
  MEASURING_THREADS: z.coerce.number().int().min(1).max(16).default(1),
  RATE_LIMITS_OFF: flag,
});

export type Environment = Readonly<z.output<typeof environmentSchema>>;

/** @throws Error that lists every bad variable by name with the mend, without its value. */
export const readEnvironment = (variables: Record<string, string | undefined>): Environment => {
  const parsed = environmentSchema.safeParse(variables);
  if (parsed.success) return Object.freeze(parsed.data);
  const faults = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
  throw new Error(`These settings are missing or wrong:\n${faults.join('\n')}`);
};
