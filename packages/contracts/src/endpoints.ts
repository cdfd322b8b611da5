import { basketEndpoints } from './basket.js';
import { deliveryEndpoints } from './delivery.js';
import type { CallInput, CallOutput, HandlerInput, HandlerOutput } from './endpoint.js';
import { fitEndpoints } from './fit.js';
import { healthEndpoints } from './health.js';
import { journalEndpoints } from './journal.js';
import { kitEndpoints } from './kits.js';
import { workshopLetterEndpoints } from './letters.js';
import { newsEndpoints } from './news.js';
import { ledgerEndpoints } from './ledger.js';
import { peopleEndpoints } from './people.js';
import { printRecordEndpoints } from './print-record.js';
import { refundEndpoints } from './refunds.js';
import { printerEndpoints } from './printers.js';
import { sessionEndpoints } from './session.js';
import { supporterEndpoints } from './supporters.js';
import { workshopKitEndpoints } from './workshop-kits.js';
import { workshopSalesEndpoints } from './workshop-sales.js';

/** Every route of the API, keyed by method and path below `/api`. */
export const endpoints = {
  ...sessionEndpoints,
  ...kitEndpoints,
  ...printerEndpoints,
  ...basketEndpoints,
  ...deliveryEndpoints,
  ...printRecordEndpoints,
  ...workshopKitEndpoints,
  ...workshopSalesEndpoints,
  ...fitEndpoints,
  ...journalEndpoints,
  ...refundEndpoints,
  ...workshopKitEndpoints,
  ...workshopSalesEndpoints,
  ...ledgerEndpoints,
  ...supporterEndpoints,
  ...fitEndpoints,
  ...journalEndpoints,
  ...workshopLetterEndpoints,
  ...newsEndpoints,
  ...ledgerEndpoints,
  ...peopleEndpoints,
  ...healthEndpoints,
};

export type Endpoints = typeof endpoints;
export type EndpointKey = keyof Endpoints;
/** `{params, query, body}` as a caller sends them. */
export type InputOf<K extends EndpointKey> = CallInput<Endpoints[K]>;
/** The answer as a caller gets it. */
export type OutputOf<K extends EndpointKey> = CallOutput<Endpoints[K]>;
/** `{params, query, body}` as a handler gets them, validated. */
export type Handled<K extends EndpointKey> = HandlerInput<Endpoints[K]>;
/** What a handler returns. */
export type Answer<K extends EndpointKey> = HandlerOutput<Endpoints[K]>;
