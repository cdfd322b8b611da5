import { execFileSync } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import type { WorkshopOrder } from '@windchest/contracts';
import { startRefundingShop, type RefundingShop } from '../testing/money-back.js';
import { signInAs } from '../testing/sign-in.js';
import type { Browser } from '../testing/test-app.js';

describe('receipts and credit notes', () => {
  let shop: RefundingShop;
  let order: Awaited<ReturnType<RefundingShop['buyBoth']>>;
  let shown: WorkshopOrder;
  beforeAll(async () => {
    shop = await startRefundingShop();
    order = await shop.buyBoth({ email: 'turnstone@mail.example' });
    await shop.buyBoth();
    const [knot] = (await shop.show(order.orderId)).lines;
    await shop
      .askRefund(order.orderId, {
        lines: [{ orderLineId: knot!.id, amountMinor: 450, keepsEntitlement: true }],
      })
      .expect(202);
    await shop.deliver();
    shown = await shop.show(order.orderId);
  });
  afterAll(() => shop.stop());

  const pdf = (browser: Browser, path: string) =>
    browser
      .get(path)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      });
  const words = (bytes: Buffer): string =>
    execFileSync('pdftotext', ['-layout', '-', '-'], { input: bytes, encoding: 'utf8' }).replaceAll(
      /\s+/g,
      ' ',
    );

  it('are handed out as PDF to the buyer, by the order’s key and to the workshop, and to nobody else', async () => {
    const notes = `credit-notes/${shown.refunds[0]?.creditNote?.id}.pdf`;
    for (const file of ['receipt.pdf', notes]) {
      const path = `/api/orders/${order.orderId}/${file}`;
      const own = await pdf(shop.browser(), `${path}?key=${order.orderKey}`).expect(200);
      expect(own.headers['content-type']).toBe('application/pdf');
      expect(own.headers['content-disposition']).toMatch(
        /^inline; filename="(receipt|credit-note)-\d{4}-C?\d+\.pdf"$/,
      );
      const again = await pdf(shop.bookkeeper, `/api/workshop/orders/${order.orderId}/${file}`).expect(200);
      expect((again.body as Buffer).equals(own.body as Buffer)).toBe(true);
      await shop.browser().get(path).expect(404);
      await shop
        .browser()
        .get(`${path}?key=${'x'.repeat(43)}`)
        .expect(404);
      await (await signInAs(shop, 'buyer')).get(path).expect(404);
    }
    const receipt = words(
      (await pdf(shop.bookkeeper, `/api/workshop/orders/${order.orderId}/receipt.pdf`)).body as Buffer,
    );
    for (const said of [
      `Receipt ${shown.receiptNumber}`,
      'turnstone@mail.example',
      '€28.99',
      'Knot',
      'Plover',
    ])
      expect(receipt).toContain(said);
    const note = words(
      (await pdf(shop.bookkeeper, `/api/workshop/orders/${order.orderId}/${notes}`)).body as Buffer,
    );
    expect(note).toContain(`Corrects receipt ${shown.receiptNumber}`);
    expect(note).toContain('€4.50');
  });

  it('do not exist before an order is paid, nor under another order', async () => {
    const placed = await shop.checkout([shop.knot.licenceId]);
    await shop.browser().get(`/api/orders/${placed.orderId}/receipt.pdf?key=${placed.orderKey}`).expect(404);
    await shop.bookkeeper
      .get(`/api/workshop/orders/${placed.orderId}/credit-notes/${shown.refunds[0]?.creditNote?.id}.pdf`)
      .expect(404);
    await shop.bookkeeper
      .get(`/api/workshop/orders/${order.orderId}/credit-notes/${randomUUID()}.pdf`)
      .expect(404);
  });

  it('name a buyer whose address is known only where the sum asks for it', async () => {
    const { licenceId } = shop.plover;
    await shop.database.query('UPDATE licences SET price_minor = 10001 WHERE id = ?', {
      replacements: [licenceId],
    });
    const placed = await shop.checkout([licenceId]);
    await shop.control(`/sessions/${placed.paymentUrl?.split('/').at(-1)}/pay`, {
      country: 'DE',
      name: 'Ada Lind',
      line1: 'Am Deich 14',
      postalCode: '26506',
      city: 'Norden',
    });
    await shop.deliver();
    const dear = words(
      (await pdf(shop.bookkeeper, `/api/workshop/orders/${placed.orderId}/receipt.pdf`)).body as Buffer,
    );
    for (const said of ['Invoice', 'Ada Lind', 'Am Deich 14', '26506 Norden', 'Germany'])
      expect(dear).toContain(said);
  });

  it('stand in one list, by number, year, country and kind, and leave as CSV that adds up', async () => {
    const list = async (query: object) =>
      (await shop.bookkeeper.get('/api/workshop/receipts').query(query).expect(200)).body;
    const number = shown.refunds[0]?.creditNote?.number ?? '';
    expect(await list({ search: number.toLowerCase() })).toMatchObject({
      total: 1,
      items: [
        {
          kind: 'credit-note',
          number,
          orderNumber: shown.number,
          email: 'turnstone@mail.example',
          country: 'DE',
          // 4.50 with 19 % in it: 3.78 and 0.72 (Python decimal, ROUND_HALF_UP, with VAT as the rest).
          net: { minor: -378, currency: 'EUR' },
          tax: { minor: -72 },
          total: { minor: -450 },
        },
      ],
    });
    expect((await list({ search: 'turnstone' })).total).toBe(2);
    expect((await list({ kind: 'receipt' })).total).toBe(3);
    expect((await list({ country: 'FR' })).total).toBe(0);
    expect((await list({ year: 2001 })).total).toBe(0);
    const sorted = await list({ sort: 'total', order: 'asc', size: 2 });
    expect(sorted).toMatchObject({ total: 4, items: [{ kind: 'credit-note' }, { kind: 'receipt' }] });

    const { text, headers } = await shop.bookkeeper
      .get('/api/workshop/receipts.csv')
      .query({ search: shown.number })
      .expect(200);
    expect(headers['content-disposition']).toContain('receipts.csv');
    const rows = text.trim().split('\r\n');
    expect(rows).toHaveLength(3);
    expect(rows[1]).toMatch(/,receipt,.*,DE,19,EUR,24\.36,4\.63,28\.99$/);
    expect(rows[2]).toMatch(/,credit-note,.*,DE,19,EUR,-3\.78,-0\.72,-4\.5$/);
  });
});
