import { createHmac, timingSafeEqual } from 'node:crypto';
import type { Readable } from 'node:stream';
import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { recipientOf } from './bounce-address.js';
import { DeadAddresses } from './dead-addresses.js';
import { readDeliveryReport, type DeliveryFailure, type DeliveryReport } from './delivery-status.js';

const MOST_BYTES = 2 * 1024 ** 2;
/** Full mailboxes, too large mails and refusals of policy come with class 5 too, yet the address lives. */
const NOT_THE_ADDRESS = /^5\.(2\.[23]|3\.4|7\.\d+)$/;

/** Takes what the mail server says of mails that came back, and writes it to the recipient it is about. */
@Injectable()
export class TakeBounce {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly tokens: LinkTokens,
    private readonly dead: DeadAddresses,
  ) {}

  async take(body: Readable, signature: string | undefined): Promise<void> {
    const secret = this.config.BOUNCE_SECRET;
    if (!secret)
      throw new Refusal('not-found', 'Delivery reports are not taken here: BOUNCE_SECRET is not set.');
    const raw = await readAll(body);
    if (!isSignedBy(secret, raw, signature))
      throw new Refusal(
        'signature-refused',
        'The signature does not fit the report. X-Windchest-Signature is the HMAC-SHA256 of the body by BOUNCE_SECRET, in hex.',
      );
    const report = await readDeliveryReport(raw);
    for (const failure of report.failures) await this.writeDown(report, failure);
  }

  private async writeDown(
    report: DeliveryReport,
    { recipient, status, diagnostic }: DeliveryFailure,
  ): Promise<void> {
    // Class 4 says that the server goes on trying.
    if (!status.startsWith('5.')) return;
    const found = await this.find(report, recipient);
    if (!found) return;
    const reason = `${status} ${diagnostic}`.trim();
    await this.transactions.run(async (tx) => {
      await touchRows(
        this.database,
        `UPDATE letter_recipients SET state = 'bounced', reason = :reason WHERE id = :id AND state IN ('handed-over', 'sent')`,
        { id: found.id, reason },
        tx,
      );
      if (!NOT_THE_ADDRESS.test(status)) await this.dead.note(found.email, reason, found.letterId, tx);
    });
  }

  /** By the return path, else by the message id in what came back; never by the address alone. */
  private async find(
    { sentTo, messageIds }: DeliveryReport,
    recipient: string,
  ): Promise<{ id: string; email: string; letterId: string } | undefined> {
    const ids = [
      ...sentTo.flatMap((address) => recipientOf(address, this.tokens) ?? []),
      ...messageIds.flatMap((messageId) => /^<([0-9a-f-]{36})@/i.exec(messageId)?.[1] ?? []),
    ];
    if (ids.length === 0) return undefined;
    const rows = await selectRows<{ id: string; email: string; letterId: string }>(
      this.database,
      'SELECT id, email, letter_id AS letterId FROM letter_recipients WHERE id IN (:ids)',
      { ids },
    );
    return rows.find(({ email }) => email.toLowerCase() === recipient) ?? rows[0];
  }
}

const readAll = async (body: Readable): Promise<Buffer> => {
  const chunks: Buffer[] = [];
  let bytes = 0;
  for await (const chunk of body as AsyncIterable<Buffer>) {
    bytes += chunk.length;
    if (bytes > MOST_BYTES)
      throw new Refusal(
        'file-too-large',
        'A delivery report has 2 MiB at most. Send it without the whole mail.',
      );
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
};

const isSignedBy = (secret: string, raw: Buffer, signature: string | undefined): boolean => {
  const expected = createHmac('sha256', secret).update(raw).digest();
  const given = Buffer.from((signature ?? '').replace(/^sha256=/, ''), 'hex');
  return given.length === expected.length && timingSafeEqual(given, expected);
};
