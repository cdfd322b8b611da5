import { Readable } from 'node:stream';
import MailComposer from 'nodemailer/lib/mail-composer';
import type SMTPConnection from 'nodemailer/lib/smtp-connection';
import { Mailer, MailPutOff, MailRefused, type OutgoingMail, type SendingSteps } from './mailer.js';
import { SmtpConnections } from './smtp-connections.js';

/**
 * Over SMTP. The transports of the library begin to read a mail before the server is ready for it, so
 * the mail goes out through its connection directly, which reads it only after `354`.
 */
export class SmtpMailer extends Mailer {
  private readonly connections: SmtpConnections;

  constructor(
    url: string,
    private readonly from: string,
  ) {
    super();
    this.connections = new SmtpConnections(url);
  }

  async send(mail: OutgoingMail, steps: SendingSteps): Promise<void> {
    const composed = new MailComposer({
      from: this.from,
      to: mail.to,
      subject: mail.subject,
      html: mail.html,
      text: mail.text,
      messageId: mail.messageId,
      ...(mail.returnPath ? { envelope: { from: mail.returnPath, to: mail.to } } : {}),
      headers: { 'Auto-Submitted': 'auto-generated', ...mail.headers },
    }).compile();
    const { from, to } = composed.getEnvelope();
    const whole = await composed.build();
    await this.connections.with((connection) =>
      deliver(connection, { from: from || '', to }, withLastLineHeld(whole, steps)),
    );
  }

  close(): Promise<void> {
    this.connections.close();
    return Promise.resolve();
  }
}

/** The bytes of a mail; its end, and with it the last line, waits for the hand-over. */
const withLastLineHeld = (whole: Buffer, steps: SendingSteps): Readable =>
  Readable.from(
    (async function* () {
      yield whole;
      await steps.beforeLastLine();
    })(),
    { objectMode: false },
  );

const deliver = (
  connection: SMTPConnection,
  envelope: { from: string; to: string[] },
  message: Readable,
): Promise<void> =>
  new Promise((resolve, reject) => {
    connection.send(envelope, message, (fault) => {
      if (!fault) return resolve();
      const { responseCode } = fault as { responseCode?: number };
      const { message } = fault as Error;
      if (responseCode && responseCode >= 500) return reject(new MailRefused(message));
      reject(responseCode && responseCode >= 400 ? new MailPutOff(message) : (fault as Error));
    });
  });
