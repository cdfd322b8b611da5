import { Mailer, type OutgoingMail, type SendingSteps } from '../adapters/mailer/mailer.js';

/** Keeps what would have been sent. */
export class RecordingMailer extends Mailer {
  readonly sent: OutgoingMail[] = [];

  async send(mail: OutgoingMail, steps: SendingSteps): Promise<void> {
    await steps.beforeLastLine();
    this.sent.push(mail);
  }

  close(): Promise<void> {
    return Promise.resolve();
  }

  lastTo(address: string): OutgoingMail {
    const mail = this.sent.findLast((one) => one.to === address);
    if (!mail) throw new Error(`No mail was sent to ${address}.`);
    return mail;
  }

  /** The secret at the end of the first link of this path in the last mail to an address. */
  tokenFor(address: string, path: string): string {
    const found = new RegExp(`${path}[/?#](?:token=)?([A-Za-z0-9_-]{43})`).exec(this.lastTo(address).text);
    if (!found?.[1]) throw new Error(`The last mail to ${address} has no link to ${path}.`);
    return found[1];
  }
}
