import { recipientOf, returnPathOf } from './bounce-address.js';
import { isDeadAddressReply } from './dead-addresses.js';
import { readDeliveryReport } from './delivery-status.js';
import { heldBetween } from './letter-matter.js';

const tokens = { sign: (text: string) => `signature of ${text}` };
const id = '018f3a5e-7b1c-7def-8123-456789abcdef';

describe('a return path', () => {
  it('names its recipient, also when its capitals changed on the way', () => {
    const path = returnPathOf('bounces@saltmarsh.example', id, tokens);
    expect(recipientOf(path.toUpperCase(), tokens)).toBe(id);
    // RFC 5321 §4.5.3.1.1 allows 64 octets before the @.
    expect(path.indexOf('@')).toBeLessThanOrEqual(64);
  });

  it('made up by somebody else names nobody', () => {
    const path = returnPathOf('bounces@saltmarsh.example', id, {
      sign: () => 'another signature altogether',
    });
    expect([recipientOf(path, tokens), recipientOf('bounces@saltmarsh.example', tokens)]).toEqual([
      null,
      null,
    ]);
  });
});

describe('a delivery report', () => {
  it('of two recipients in one, with a folded line, gives those that failed', async () => {
    const report = await readDeliveryReport(
      Buffer.from(
        [
          'To: <bounces+x@saltmarsh.example>',
          'MIME-Version: 1.0',
          'Content-Type: multipart/report; report-type=delivery-status; boundary=b',
          '',
          '--b',
          'Content-Type: message/delivery-status',
          '',
          'Reporting-MTA: dns; mx.example',
          '',
          'Original-Recipient: rfc822;Wren@mail.example',
          'Final-Recipient: rfc822;w@inner.example',
          'Action: failed',
          'Status: 5.1.1 (bad mailbox)',
          'Diagnostic-Code: smtp; 550 no',
          ' such user',
          '',
          'Final-Recipient: rfc822;teal@mail.example',
          'Action: delayed',
          'Status: 4.4.1',
          '',
          '--b',
          'Content-Type: text/rfc822-headers',
          '',
          `Message-ID: <${id}@saltmarsh.example>`,
          '--b--',
          '',
        ].join('\r\n'),
      ),
    );
    expect(report.failures).toEqual([
      { recipient: 'wren@mail.example', status: '5.1.1', diagnostic: '550 no such user' },
    ]);
    expect(report.sentTo).toEqual(['bounces+x@saltmarsh.example']);
    expect(report.messageIds).toEqual([`<${id}@saltmarsh.example>`]);
  });

  it('is not taken from an ordinary mail', async () => {
    expect(
      (await readDeliveryReport(Buffer.from('Subject: hello\r\n\r\nAction: failed\r\n'))).failures,
    ).toEqual([]);
  });

  // RFC 3463 §3.2 and §3.3.
  it.each([
    ['550 5.1.1 no such user', true],
    ['550 5.2.1 disabled', true],
    ['552 5.2.2 mailbox full', false],
    ['554 5.7.1 policy', false],
  ])('%s is about the address: %s', (reply, expected) => expect(isDeadAddressReply(reply)).toBe(expected));
});

describe('revisions held between two', () => {
  const revisions = ['3', '2', '1'].map((one) => ({ id: one }));
  it.each([
    [null, null, ['3', '2', '1']],
    ['2', null, ['3', '2']],
    [null, '2', ['2', '1']],
    ['2', '2', ['2']],
    ['3', '1', []],
    ['gone', null, []],
  ])('from %s to %s', (from, to, held) => expect(heldBetween(revisions, from, to)).toEqual(held));
});
