import { parseConnectionUrl } from 'nodemailer/lib/shared';
import SMTPConnection from 'nodemailer/lib/smtp-connection';

const IDLE_MS = 15_000;
const MOST_MAILS = 200;

interface Kept {
  readonly connection: SMTPConnection;
  sent: number;
  timer?: NodeJS.Timeout;
}

/** Connections to one mail server, kept open for a while between mails. */
export class SmtpConnections {
  private readonly idle: Kept[] = [];

  constructor(private readonly url: string) {}

  /** Lends a connection for one mail. It is kept for the next one only where that mail went well. */
  async with<T>(work: (connection: SMTPConnection) => Promise<T>): Promise<T> {
    const kept = this.takeIdle() ?? (await this.open());
    try {
      const result = await work(kept.connection);
      this.keep(kept);
      return result;
    } catch (fault) {
      kept.connection.close();
      throw fault;
    }
  }

  close(): void {
    for (const { connection, timer } of this.idle.splice(0)) {
      clearTimeout(timer);
      connection.quit();
    }
  }

  private takeIdle(): Kept | undefined {
    for (;;) {
      const kept = this.idle.pop();
      if (!kept) return undefined;
      clearTimeout(kept.timer);
      if (!kept.connection.destroyed) return kept;
    }
  }

  private keep(kept: Kept): void {
    kept.sent += 1;
    if (kept.sent >= MOST_MAILS) return kept.connection.quit();
    kept.timer = setTimeout(() => {
      this.idle.splice(this.idle.indexOf(kept), 1);
      kept.connection.quit();
    }, IDLE_MS);
    kept.timer.unref();
    this.idle.push(kept);
  }

  private open(): Promise<Kept> {
    const { auth, ...options } = parseConnectionUrl(this.url);
    const connection = new SMTPConnection({
      connectionTimeout: 15_000,
      greetingTimeout: 15_000,
      socketTimeout: 60_000,
      ...options,
    } as ConstructorParameters<typeof SMTPConnection>[0]);
    return new Promise((resolve, reject) => {
      const kept: Kept = { connection, sent: 0 };
      // An idle connection may break at any time; nobody waits for it then, and the next mail opens another.
      connection.on('error', reject);
      connection.connect((fault) => {
        if (fault) return reject(fault as Error);
        if (!auth) return resolve(kept);
        connection.login(auth as Parameters<SMTPConnection['login']>[0], (refused) =>
          refused ? reject(refused as Error) : resolve(kept),
        );
      });
    });
  }
}
