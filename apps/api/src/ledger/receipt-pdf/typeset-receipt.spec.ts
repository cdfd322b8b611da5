import { execFileSync } from 'node:child_process';
import type { ReceiptLine } from '../receipt-parties.js';
import {
  describeCreditNote,
  describeReceipt,
  type Letterhead,
  type WrittenCreditNote,
  type WrittenReceipt,
} from './describe-receipt.js';
import { typesetReceipt } from './typeset-receipt.js';

const letterhead: Letterhead = {
  shop: { name: 'Saltmarsh Sound Works', address: 'https://saltmarsh.example' },
  seller: {
    name: 'Merrin Holloway, trading as Saltmarsh Sound Works',
    address: '3 Sluice Lane, Marshfoot',
    country: 'IE',
    vatNumber: 'IE1234567X',
  },
  locale: 'en-IE',
};
const line = (
  orderLineId: string,
  priceMinor: number,
  discountMinor: number,
  ratePercent = '25.5',
): ReceiptLine => ({
  orderLineId,
  kit: `Curlew ${orderLineId}`,
  licence: 'Personal prints',
  revision: 'Mk 1.4',
  priceMinor,
  discountMinor,
  totalMinor: priceMinor - discountMinor,
  ratePercent,
});
// 55.00 with 25.5 % in it: 43.82 and 11.18 (Python decimal, ROUND_HALF_UP, with VAT as the rest).
const receipt: WrittenReceipt = {
  label: '2026-000391',
  orderNumber: 'W-7K2M9Q',
  currency: 'EUR',
  totalMinor: 5500,
  taxTreatment: 'consumer',
  tax: [{ country: 'FI', ratePercent: '25.5', netMinor: 4382, taxMinor: 1118 }],
  buyer: { email: 'wren@mail.example', country: 'FI' },
  seller: null,
  lines: [line('A', 2400, 800), line('B', 3900, 0)],
  issuedAt: new Date('2026-11-12T09:30:00Z'),
};
const business: WrittenReceipt = {
  ...receipt,
  totalMinor: 45_000,
  buyer: {
    email: 'orders@reedhouse.example',
    country: 'DE',
    name: 'Reedhouse Music School',
    address: ['Am Deich 14', '26506 Norden'],
    vatNumber: 'DE999999999',
  },
  taxTreatment: 'reverse-charge',
  tax: [{ country: 'DE', ratePercent: '0', netMinor: 45_000, taxMinor: 0 }],
  lines: Array.from({ length: 30 }, (_, n) => line(`no ${n}`, 1500, 0, '0')),
};
const note: WrittenCreditNote = {
  label: '2026-C00012',
  totalMinor: 1600,
  tax: [{ country: 'FI', ratePercent: '25.5', netMinor: 1275, taxMinor: 325 }],
  lines: [
    {
      orderLineId: 'A',
      kit: 'Curlew A',
      licence: 'Personal prints',
      revision: 'Mk 1.4',
      ratePercent: '25.5',
      totalMinor: 1600,
      netMinor: 1275,
    },
  ],
  cause: 'refund',
  issuedAt: new Date('2026-11-20T10:00:00Z'),
};

const read = (pdf: Buffer, ...options: string[]): string =>
  execFileSync('pdftotext', [...options, '-', '-'], { input: pdf, encoding: 'utf8' });
const words = (pdf: Buffer): string => read(pdf, '-layout').replaceAll(/\s+/g, ' ');

describe('a receipt as PDF', () => {
  it('carries what a VAT invoice must say', async () => {
    const text = words(await typesetReceipt(describeReceipt(receipt, letterhead)));
    // Directive 2006/112/EC, art. 226, by its points; name and address of a private buyer are not needed (226b).
    for (const [point, said] of [
      ['1 date of issue', 'Issued Supplied'],
      ['1', '12 November 2026'],
      ['2 number', 'Receipt 2026-000391'],
      ['3 VAT number', 'VAT number IE1234567X'],
      ['5 name and address', 'Merrin Holloway, trading as'],
      ['5', '3 Sluice Lane, Marshfoot'],
      ['5', 'wren@mail.example'],
      ['5', 'Finland'],
      ['6 quantity and nature', 'Digital files to print'],
      ['6', 'Curlew A Mk 1.4 1'],
      ['7 date of supply', 'paid on 12 November 2026'],
      ['8 taxable amount, unit price', '€43.82'],
      ['8 discount', '€24.00 less €8.00'],
      ['9 rate', '25.5 %'],
      ['10 tax', '€11.18'],
    ] as const)
      expect([point, text.includes(said) ? said : text]).toEqual([point, said]);
    expect(text).not.toContain('Reverse charge');
    expect(text).not.toMatch(/adviser/);
  });

  it('has unit prices without tax that add up to the taxable amount', () => {
    const { lines } = describeReceipt(receipt, letterhead);
    expect(lines.map((one) => one.netMinor)).toEqual([1275, 3107]);
  });

  it('names a business, its address and VAT number, and says who owes the tax', async () => {
    const pdf = await typesetReceipt(describeReceipt(business, letterhead));
    const text = words(pdf);
    for (const said of ['Invoice 2026-000391', 'Reedhouse Music School', 'Am Deich 14', '26506 Norden'])
      expect(text).toContain(said);
    // Art. 226, points 4 and 11a.
    expect(text).toContain('Reverse charge: the customer, VAT number DE999999999, is liable for the VAT');
    const pages = read(pdf).split('\f').slice(0, -1);
    expect(pages.length).toBeGreaterThan(1);
    // The title block stands on the last sheet, and never alone.
    expect(pages.at(-1)).toContain('Taxable amount');
    expect(pages.at(-1)).toContain(`${pages.length} of ${pages.length}`);
    expect(pages[0]).toContain(`1 of ${pages.length}`);
  });

  it('says so where no tax is charged', async () => {
    const untaxed: WrittenReceipt = {
      ...business,
      taxTreatment: 'consumer',
      buyer: { email: 'a@mail.example', country: 'US' },
    };
    const text = words(await typesetReceipt(describeReceipt(untaxed, letterhead)));
    expect(text).toContain('No VAT is charged.');
    expect(text).toContain('Receipt 2026-000391');
    const abroad: WrittenReceipt = { ...business, taxTreatment: 'business-abroad' };
    expect(words(await typesetReceipt(describeReceipt(abroad, letterhead)))).toContain(
      'a business established outside the European Union',
    );
  });

  it('of a credit note names the receipt that it corrects, and takes back its share of the tax', async () => {
    const text = words(await typesetReceipt(describeCreditNote(note, receipt, letterhead)));
    // Art. 219.
    expect(text).toContain('Credit note 2026-C00012');
    expect(text).toContain('Corrects receipt 2026-000391 of 12 November 2026, order W-7K2M9Q.');
    for (const said of ['20 November 2026', '€12.75', '€3.25', '€16.00', 'Goes back, with VAT'])
      expect(text).toContain(said);
    expect(text).not.toContain('Curlew B');
    const lost = words(
      await typesetReceipt(describeCreditNote({ ...note, cause: 'dispute' }, receipt, letterhead)),
    );
    expect(lost).toContain('by a decision of their bank');
  });

  it('is the same bytes each time, and stays with the seller who issued it', async () => {
    const first = await typesetReceipt(describeReceipt(receipt, letterhead));
    expect(first.equals(await typesetReceipt(describeReceipt(receipt, letterhead)))).toBe(true);
    const seller = { ...letterhead.seller, name: 'Whoever sold it then' };
    expect(words(await typesetReceipt(describeReceipt({ ...receipt, seller }, letterhead)))).toContain(
      'Whoever sold it then',
    );
  });

  it('is tagged for reading aloud, with a title and a language', async () => {
    const pdf = await typesetReceipt(describeReceipt(receipt, letterhead));
    const facts = execFileSync('pdfinfo', ['-'], { input: pdf, encoding: 'utf8' });
    expect(facts).toMatch(/^Tagged:\s+yes/m);
    expect(facts).toMatch(/^Title:\s+Receipt 2026-000391/m);
    expect(facts).toMatch(/^Pages:\s+1$/m);
  });
});
