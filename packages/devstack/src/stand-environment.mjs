import { join } from 'node:path';
import { projectRoot } from './paths.mjs';

/** @typedef {'start' | 'dev' | 'throwaway'} StandMode */
/**
 * @typedef {object} StandFacts
 * @property {StandMode} mode
 * @property {string} folder
 * @property {import('./ports.mjs').Ports} ports
 * @property {import('./secrets.mjs').Secrets} secrets
 * @property {import('./mariadb.mjs').DatabaseAddress} database
 */

/** @param {number} port */
const local = (port) => `http://127.0.0.1:${port}`;

/**
 * What a stand keeps, and where.
 * @param {string} folder
 */
export function standPlaces(folder) {
  return {
    database: join(folder, 'database'),
    files: join(folder, 'files'),
    mails: join(folder, 'mails'),
    paymentState: join(folder, 'payments.json'),
    seedMark: join(folder, 'seed.json'),
    logs: join(folder, 'logs'),
  };
}

/**
 * While developing, the browser talks to Vite, which passes /api on; else the API serves the pages as well.
 * Either way the shop has one address, so that mailed links and sign-ins stay good.
 * @param {Pick<StandFacts, 'mode' | 'ports'>} facts
 */
export function standAddresses({ mode, ports }) {
  const apiPort = mode === 'dev' ? ports.api : ports.shop;
  return {
    shop: local(ports.shop),
    api: local(apiPort),
    apiPort,
    stripe: local(ports.stripe),
    mail: local(ports.mailWeb),
  };
}

/**
 * @param {StandFacts} facts
 * @returns {Record<string, string>}
 */
export function apiEnvironment({ mode, folder, ports, secrets, database }) {
  const { shop, apiPort } = standAddresses({ mode, ports });
  return {
    NODE_ENV: mode === 'dev' ? 'development' : 'production',
    HOST: '127.0.0.1',
    PORT: String(apiPort),
    BASE_URL: shop,
    DB_HOST: database.host,
    DB_PORT: String(database.port),
    DB_NAME: database.name,
    DB_USER: database.user,
    DB_PASSWORD: database.password,
    SESSION_SECRET: secrets.sessionSecret,
    LINK_SECRET: secrets.linkSecret,
    FILES_DIR: standPlaces(folder).files,
    WEB_DIST: join(projectRoot, 'apps/web/dist'),
    SMTP_URL: `smtp://127.0.0.1:${ports.mailSmtp}`,
    MAIL_FROM: 'Saltmarsh Sound Works <workshop@saltmarsh.example>',
    STRIPE_KEY: secrets.stripeKey,
    STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
    STRIPE_HOST: '127.0.0.1',
    STRIPE_PORT: String(ports.stripe),
    STRIPE_PROTOCOL: 'http',
    WORKSHOP_CURRENCY: 'EUR',
    WORKSHOP_SELLER: 'Merrin Holloway, trading as Saltmarsh Sound Works',
    WORKSHOP_ADDRESS: 'The Old Net Loft, Sluice Lane 4, Ebbmouth',
    WORKSHOP_VAT_NUMBER: 'IE1234567XX',
    CHECKOUT_MINUTES: '30',
    LOG_LEVEL: process.env.LOG_LEVEL ?? 'info',
    WINDCHEST_DEMO: '1',
    // Dozens of browsers sign in from one address within a minute; the limits have tests of their own.
    ...(mode === 'throwaway' && { RATE_LIMITS_OFF: '1' }),
  };
}

/**
 * @param {StandFacts} facts
 * @returns {Record<string, string>}
 */
export function stripeEnvironment({ mode, folder, ports, secrets }) {
  const { api, stripe } = standAddresses({ mode, ports });
  return {
    FAKE_STRIPE_PORT: String(ports.stripe),
    FAKE_STRIPE_BASE_URL: stripe,
    FAKE_STRIPE_KEY: secrets.stripeKey,
    FAKE_STRIPE_WEBHOOK_URL: `${api}/api/payments/webhook`,
    FAKE_STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
    FAKE_STRIPE_STATE_FILE: standPlaces(folder).paymentState,
  };
}

/**
 * @param {StandFacts} facts
 * @returns {Record<string, string>}
 */
export function mailEnvironment({ folder, ports }) {
  return {
    FAKE_MAIL_SMTP_PORT: String(ports.mailSmtp),
    FAKE_MAIL_WEB_PORT: String(ports.mailWeb),
    FAKE_MAIL_DIR: standPlaces(folder).mails,
  };
}

/**
 * What the seed, the journeys and the benches are told of a running stand.
 * @param {StandFacts} facts
 * @returns {Record<string, string>}
 */
export function visitorEnvironment({ mode, folder, ports, secrets, database }) {
  const { shop, stripe, mail } = standAddresses({ mode, ports });
  return {
    WINDCHEST_URL: shop,
    WINDCHEST_MAIL_URL: mail,
    WINDCHEST_STRIPE_URL: stripe,
    WINDCHEST_STRIPE_KEY: secrets.stripeKey,
    WINDCHEST_STRIPE_WEBHOOK_SECRET: secrets.stripeWebhookSecret,
    WINDCHEST_FILES_DIR: standPlaces(folder).files,
    WINDCHEST_DB_HOST: database.host,
    WINDCHEST_DB_PORT: String(database.port),
    WINDCHEST_DB_NAME: database.name,
    WINDCHEST_DB_USER: database.user,
    WINDCHEST_DB_PASSWORD: database.password,
  };
}
