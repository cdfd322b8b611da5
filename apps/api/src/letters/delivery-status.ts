import { simpleParser } from 'mailparser';

export interface DeliveryFailure {
  /** As the report names it, in small letters. */
  readonly recipient: string;
  /** RFC 3463, such as `5.1.1`. */
  readonly status: string;
  readonly diagnostic: string;
}
export interface DeliveryReport {
  /** Where the report came to: the return path names the recipient. */
  readonly sentTo: readonly string[];
  /** Message ids of ours in the part of the mail that came back. */
  readonly messageIds: readonly string[];
  readonly failures: readonly DeliveryFailure[];
}

/**
 * Reads a delivery status notification (RFC 3464). Only its machine-readable part counts; what is said in
 * words differs from server to server. A mail that is no report has no failures.
 */
export const readDeliveryReport = async (raw: Buffer): Promise<DeliveryReport> => {
  const mail = await simpleParser(raw, { keepDeliveryStatus: true, skipTextToHtml: true });
  const partOf = (type: string): string =>
    mail.attachments
      .filter(({ contentType }) => contentType.toLowerCase() === type)
      .map(({ content }) => content.toString('utf8'))
      .join('\n\n');
  const status = partOf('message/delivery-status');
  const returned = ['message/rfc822', 'text/rfc822-headers', 'message/rfc822-headers'].map(partOf).join('\n');
  return {
    sentTo: [mail.to ?? []].flat().flatMap(({ value }) => value.flatMap(({ address }) => address ?? [])),
    messageIds: [...returned.matchAll(/^Message-ID:\s*(<[^>\s]+>)/gim)].flatMap(([, id]) => id ?? []),
    failures: status
      .split(/\r?\n\s*\r?\n/)
      .map(fieldsOf)
      .filter((fields) => fields.get('action')?.toLowerCase() === 'failed')
      .map((fields) => ({
        recipient: addressIn(fields.get('original-recipient') ?? fields.get('final-recipient') ?? ''),
        status: /\d\.\d{1,3}\.\d{1,3}/.exec(fields.get('status') ?? '')?.[0] ?? '',
        diagnostic: (fields.get('diagnostic-code') ?? '').replace(/^smtp;\s*/i, '').slice(0, 400),
      })),
  };
};

/** Header fields of one group, folded lines joined. */
const fieldsOf = (group: string): Map<string, string> =>
  new Map(
    group
      .replace(/\r?\n[ \t]+/g, ' ')
      .split(/\r?\n/)
      .flatMap((line) => {
        const [, name, value] = /^([\w-]+):\s*(.*)$/.exec(line) ?? [];
        return name === undefined ? [] : [[name.toLowerCase(), value ?? ''] as const];
      }),
  );

/** `rfc822; wren@mail.example` */
const addressIn = (field: string): string =>
  field
    .replace(/^[^;]*;\s*/, '')
    .replace(/^<|>$/g, '')
    .trim()
    .toLowerCase();
