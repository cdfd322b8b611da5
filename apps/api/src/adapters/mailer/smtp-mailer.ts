import { Readable } from 'node:stream';
import { createTransport, type Transporter } from 'nodemailer';
import MailComposer from 'nodemailer/lib/mail-composer/index.js';
import { Mailer, MailRefused, type OutgoingMail, type SendingSteps } from './mailer.js';

/** Over SMTP with a pool of connections. */
export class SmtpMailer extends Mailer {
  private readonly transport: Transporter;

  constructor(
    url: string,
    private readonly from: string,
  ) {
    super();
    this.transport = createTransport({ url, pool: true, maxConnections: 4, maxMessages: 500 } as never);
  }

  async send(mail: OutgoingMail, steps: SendingSteps): Promise<void> {
    const composed = new MailComposer({
      from: this.from,
      to: mail.to,
      subject: mail.subject,
      html: mail.html,
      text: mail.text,
      messageId: mail.messageId,
      headers: { 'Auto-Submitted': 'auto-generated', ...mail.headers },
    }).compile();
    const envelope = composed.getEnvelope();
    const whole = await composed.build();
    const raw = Readable.from(
      (async function* () {
        yield whole;
        await steps.beforeLastLine();
      })(),
      { objectMode: false },
    );
    try {
      await this.transport.sendMail({ envelope: { from: envelope.from || '', to: envelope.to }, raw });
    } catch (fault) {
      const { responseCode } = fault as { responseCode?: number };
      if (responseCode && responseCode >= 500) throw new MailRefused((fault as Error).message);
      throw fault;
    }
  }

  close(): Promise<void> {
    this.transport.close();
    return Promise.resolve();
  }
}
