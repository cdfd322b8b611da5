export interface OutgoingMail {
  readonly to: string;
  readonly subject: string;
  readonly html: string;
  readonly text: string;
  /** Stays the same whenever the same mail is tried again. */
  readonly messageId: string;
  /** Where the mail server reports to, if not to the sender. */
  readonly returnPath?: string;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface SendingSteps {
  /**
   * Runs when the server has taken everything but the last line. Until that line goes out the server
   * drops the mail if the connection breaks, so what is noted here and what is delivered agree even
   * when the process dies: the gap is the time between this promise and the next write to the socket.
   */
  beforeLastLine(): Promise<void>;
}

/** Sends one e-mail; answers when the server has accepted it. */
export abstract class Mailer {
  /** @throws MailRefused where the server says no for good; any other error may be tried again */
  abstract send(mail: OutgoingMail, steps: SendingSteps): Promise<void>;
  abstract close(): Promise<void>;
}

export class MailRefused extends Error {}

/** The server answered and does not take this mail now. Faults of another kind say nothing about the mail. */
export class MailPutOff extends Error {}
