import { startFakeStripe, type FakeStripeOptions } from './index.js';

/** Environment -> options; a variable that is absent or empty leaves its default. */
function optionsFrom(environment: NodeJS.ProcessEnv): FakeStripeOptions {
  const options: FakeStripeOptions = {};
  const port = environment.FAKE_STRIPE_PORT;
  if (port) {
    if (!/^\d{1,5}$/.test(port) || Number(port) > 65_535) {
      throw new Error(`FAKE_STRIPE_PORT must be a port number from 0 to 65535, not "${port}".`);
    }
    options.port = Number(port);
  }
  if (environment.FAKE_STRIPE_KEY) options.apiKey = environment.FAKE_STRIPE_KEY;
  if (environment.FAKE_STRIPE_WEBHOOK_URL) options.webhookUrl = environment.FAKE_STRIPE_WEBHOOK_URL;
  if (environment.FAKE_STRIPE_WEBHOOK_SECRET) options.webhookSecret = environment.FAKE_STRIPE_WEBHOOK_SECRET;
  if (environment.FAKE_STRIPE_STATE_FILE) options.stateFile = environment.FAKE_STRIPE_STATE_FILE;
  if (environment.FAKE_STRIPE_BASE_URL) options.publicUrl = environment.FAKE_STRIPE_BASE_URL;
  return options;
}

try {
  const standIn = await startFakeStripe(optionsFrom(process.env));
  let isStopping = false;
  const stop = () => {
    if (isStopping) return;
    isStopping = true;
    void standIn.stop().then(() => process.exit(0));
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  console.log(JSON.stringify({ ready: true, url: standIn.url }));
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
