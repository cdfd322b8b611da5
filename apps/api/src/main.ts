import 'reflect-metadata';
import type { Server } from 'node:http';
import { CONFIG, type Config } from './config/config.js';
import { createApp } from './create-app.js';

const GRACE_MS = 10_000;
const UPLOAD_LIMIT_MS = 6 * 3600_000;

const main = async (): Promise<void> => {
  const app = await createApp();
  const config = app.get<Config>(CONFIG);
  // A large file over a slow line takes its time; the headers still have to come within a minute.
  (app.getHttpServer() as Server).requestTimeout = UPLOAD_LIMIT_MS;
  await app.listen(config.PORT, config.HOST);
  const stop = (): void => {
    // Running downloads get a while; then their connections are cut so that the process can end.
    const server = app.getHttpServer() as Server;
    setTimeout(() => server.closeAllConnections(), GRACE_MS).unref();
    app.close().then(
      () => process.exit(0),
      () => process.exit(1),
    );
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
};

main().catch((fault: unknown) => {
  console.error(fault instanceof Error ? fault.message : fault);
  process.exit(1);
});
