import type { AddressInfo } from 'node:net';
import { settingsFrom, type FakeStripeOptions } from './options.js';
import { buildServer } from './server.js';
import { StandIn } from './stand-in.js';
import { catchUp } from './time/catch-up.js';
import { WebhookSender } from './webhooks/webhook-sender.js';

export { defaultApiKey, defaultWebhookSecret, type FakeStripeOptions } from './options.js';

export type FakeStripe = {
  /** Where the API answers: `http://127.0.0.1:<port>`. */
  url: string;
  host: '127.0.0.1';
  port: number;
  apiKey: string;
  webhookSecret: string;
  /** Sends webhooks there from now on, or nowhere. A shop in a test may start after the stand-in. */
  setWebhookUrl(url: string | null): void;
  /** Ends listening and sending; what was not delivered stays in the state file, if there is one. */
  stop(): Promise<void>;
};

/**
 * Starts the stand-in for the payment service on the loopback address.
 * @throws Error where the port is taken or the state file cannot be used
 */
export async function startFakeStripe(options: FakeStripeOptions = {}): Promise<FakeStripe> {
  const standIn = new StandIn(settingsFrom(options));
  const sender = new WebhookSender(standIn);
  const app = buildServer(standIn, sender);
  const server = await new Promise<ReturnType<typeof app.listen>>((resolve, reject) => {
    const listener = app.listen(options.port ?? 0, '127.0.0.1', (error?: Error) =>
      error ? reject(error) : resolve(listener),
    );
  });
  const { port } = server.address() as AddressInfo;
  const url = `http://127.0.0.1:${port}`;
  standIn.settings.publicUrl ||= url;

  const sweep = setInterval(() => catchUp(standIn), standIn.settings.sweepMs);
  sweep.unref();
  standIn.onWake = () => catchUp(standIn);

  return {
    url,
    host: '127.0.0.1',
    port,
    apiKey: standIn.settings.apiKey,
    webhookSecret: standIn.settings.webhookSecret,
    setWebhookUrl: (address) => {
      standIn.settings.webhookUrl = address;
    },
    stop: async () => {
      clearInterval(sweep);
      standIn.stop();
      const closed = new Promise((resolve) => server.close(resolve));
      server.closeAllConnections();
      await Promise.all([closed, sender.stop()]);
      standIn.save();
    },
  };
}
