/** What a caller may set when starting the stand-in; everything has a default. */
export type FakeStripeOptions = {
  /** 0, the default, takes any free port. The server listens on 127.0.0.1 alone. */
  port?: number;
  /** The one secret key that is let in. */
  apiKey?: string;
  webhookUrl?: string;
  webhookSecret?: string;
  /** Where the buyer's browser finds the payment page; default `http://127.0.0.1:<port>`. */
  publicUrl?: string;
  /** A file that keeps the state over a restart. Without one, the state is in memory alone. */
  stateFile?: string;
  /** Same seed, same ids and same webhook weather. Default: a random one. */
  seed?: number;
  /** Shortest life of a checkout session. The real service wants 30 minutes; tests may want less. */
  minimumSessionSeconds?: number;
  /** Waits before the second, third, … attempt of a webhook. */
  webhookRetrySeconds?: readonly number[];
  /** Factor on those waits: 0.001 turns seconds into milliseconds. */
  webhookTimeScale?: number;
  /** How long an endpoint may take to answer a webhook. */
  webhookTimeoutMs?: number;
  /** How long every API call takes before it is worked on; lets concurrent calls overlap. */
  latencyMs?: number;
  /** How often open sessions are looked at for expiry, besides at every call. */
  sweepMs?: number;
};

export type Settings = Required<
  Omit<FakeStripeOptions, 'port' | 'stateFile' | 'webhookUrl' | 'publicUrl'>
> & {
  stateFile: string | null;
  webhookUrl: string | null;
  publicUrl: string;
};

export const defaultApiKey = 'sk_test_windchest_local';
export const defaultWebhookSecret = 'whsec_windchest_local';

/** Longest life of a checkout session, and the default when none is asked for. */
export const maximumSessionSeconds = 24 * 3600;

// The real service tries for up to three days with growing waits; the first steps here are shorter so
// that somebody at a development server sees them happen.
const retrySeconds = [10, 60, 300, 1800, 7200, 18000, 36000, 43200, 43200];

/** Fills the gaps. `publicUrl` is completed once the port is known. */
export function settingsFrom(options: FakeStripeOptions): Settings {
  return {
    apiKey: options.apiKey ?? defaultApiKey,
    webhookSecret: options.webhookSecret ?? defaultWebhookSecret,
    webhookUrl: options.webhookUrl ?? null,
    publicUrl: (options.publicUrl ?? '').replace(/\/+$/, ''),
    stateFile: options.stateFile ?? null,
    seed: options.seed ?? Math.floor(Math.random() * 2 ** 32),
    minimumSessionSeconds: options.minimumSessionSeconds ?? 30 * 60,
    webhookRetrySeconds: options.webhookRetrySeconds ?? retrySeconds,
    webhookTimeScale: options.webhookTimeScale ?? 1,
    webhookTimeoutMs: options.webhookTimeoutMs ?? 10_000,
    latencyMs: options.latencyMs ?? 0,
    sweepMs: options.sweepMs ?? 1000,
  };
}
