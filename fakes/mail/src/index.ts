import { mkdir } from 'node:fs/promises';
import { MailDev } from 'maildev';

export type FakeMailOptions = {
  /** 0, the default, takes any free port. */
  smtpPort?: number;
  webPort?: number;
  /** Where messages are kept, one file each. They are there again after a restart. */
  mailDirectory: string;
};

export type FakeMail = {
  host: '127.0.0.1';
  smtpPort: number;
  webPort: number;
  /** The page for reading; the messages as JSON are at `/api/email` below it. */
  url: string;
  stop(): Promise<void>;
};

/**
 * Starts a mail server that takes every message and passes none on, and a page to read them on. Both
 * listen on the loopback address alone.
 * @throws Error where a port is taken or the folder cannot be made
 */
export async function startFakeMail(options: FakeMailOptions): Promise<FakeMail> {
  // A folder of its own: without one, the messages of every installation on the machine would mix.
  await mkdir(options.mailDirectory, { recursive: true, mode: 0o700 });
  const server = new MailDev({
    smtp: options.smtpPort ?? 0,
    web: options.webPort ?? 0,
    ip: '127.0.0.1',
    webIp: '127.0.0.1',
    mailDirectory: options.mailDirectory,
    silent: true,
  });
  const { smtp, api } = await server.start();
  const smtpPort = smtp.getAddress().port;
  const webPort = api?.getAddress()?.port;
  if (!webPort) {
    await server.stop();
    throw new Error('The mail page did not say on which port it listens.');
  }
  return {
    host: '127.0.0.1',
    smtpPort,
    webPort,
    url: `http://127.0.0.1:${webPort}`,
    stop: () => server.stop(),
  };
}
