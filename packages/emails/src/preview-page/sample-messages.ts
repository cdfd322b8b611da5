import { money } from '@windchest/money';
import { letterContent, reprintBlocks } from '../templates/letter-mails.js';
import type { EmailMessage, EmailWorkshop } from '../email-message.js';
import { samplePledges } from './sample-pledges.js';

export const sampleWorkshop: EmailWorkshop = {
  name: 'Saltmarsh Sound Works',
  baseUrl: 'https://saltmarsh.example',
  address: '3 Sluice Lane, Marshfoot',
  replyTo: 'bench@saltmarsh.example',
  locale: 'en-GB',
};

const eur = (minor: number) => money(minor, 'EUR');
const token = '8r2mQk7wXb1ZcV5nT0yLh3sFgD9pJe6uAoIiR4tNwMx';
const page = `https://saltmarsh.example/get/${token}`;
const cautionsLine =
  'Air the room while you print. Wear eye protection when you stretch bands. Small parts: not for children under three. The build book has the whole list.';

/** Every mail, and the forms of it that differ most. */
export const sampleMessages: readonly { title: string; message: EmailMessage }[] = [
  {
    title: 'Confirm the address',
    message: {
      template: 'verify-address',
      name: 'Wren',
      link: `https://saltmarsh.example/confirm/${token}`,
      hours: 24,
    },
  },
  {
    title: 'Sign-in link',
    message: { template: 'sign-in-link', link: `https://saltmarsh.example/enter/${token}`, minutes: 15 },
  },
  {
    title: 'New passphrase',
    message: { template: 'reset-passphrase', link: `https://saltmarsh.example/renew/${token}`, minutes: 30 },
  },
  {
    title: 'Address joined already',
    message: {
      template: 'address-already-joined',
      name: 'Wren',
      signInLink: 'https://saltmarsh.example/sign-in',
      resetLink: 'https://saltmarsh.example/renew',
    },
  },
  {
    title: 'Passphrase changed',
    message: {
      template: 'passphrase-changed',
      name: 'Wren',
      when: '2026-12-01T14:40:00Z',
      resetLink: 'https://saltmarsh.example/renew',
    },
  },
  {
    title: 'Order paid, with a coupon',
    message: {
      template: 'order-paid',
      name: 'Wren',
      orderNumber: 'W-2026-0417',
      receiptNumber: '2026-000391',
      lines: [
        {
          kit: 'Curlew',
          licence: 'personal prints',
          revision: 'Mk 1.4',
          total: eur(1600),
          discount: eur(800),
        },
        { kit: 'Reed Bunting', licence: 'classroom', revision: 'Mk 2.0', total: eur(3900) },
      ],
      subtotal: eur(6300),
      discount: eur(800),
      couponCode: 'FIRSTWIND',
      total: eur(5500),
      tax: [{ rateLabel: 'VAT 19 %', amount: eur(878) }],
      link: page,
      linkDays: 30,
      linkUses: 5,
      orderLink: 'https://saltmarsh.example/orders/W-2026-0417',
      cautionsLine,
    },
  },
  {
    title: 'Order paid, a business’s gift',
    message: {
      template: 'order-paid',
      name: 'Marlow',
      orderNumber: 'W-2026-0419',
      receiptNumber: '2026-000393',
      lines: [{ kit: 'Curlew', licence: 'personal prints', revision: 'Mk 1.4', total: eur(2017) }],
      subtotal: eur(2017),
      total: eur(2017),
      tax: [],
      taxNote: 'Reverse charge: your business owes the VAT in its own country.',
      giftTo: 'wren@mail.example',
      link: 'https://saltmarsh.example/orders/W-2026-0419',
      linkDays: 30,
      linkUses: 5,
      orderLink: 'https://saltmarsh.example/orders/W-2026-0419',
      cautionsLine,
    },
  },
  {
    title: 'Order of a free kit',
    message: {
      template: 'order-paid',
      orderNumber: 'W-2026-0418',
      receiptNumber: '2026-000392',
      lines: [{ kit: 'Clearance gauge', licence: 'personal prints', revision: 'Mk 1.0', total: eur(0) }],
      subtotal: eur(0),
      total: eur(0),
      tax: [],
      link: page,
      linkDays: 30,
      linkUses: 5,
      orderLink: 'https://saltmarsh.example/orders/W-2026-0418',
      cautionsLine,
    },
  },
  {
    title: 'New download link',
    message: {
      template: 'new-download-link',
      link: page,
      linkDays: 30,
      linkUses: 5,
      kits: ['Curlew', 'Reed Bunting'],
    },
  },
  {
    title: 'Refund',
    message: {
      template: 'order-refunded',
      name: 'Wren',
      orderNumber: 'W-2026-0417',
      receiptNumber: '2026-000391',
      creditNoteNumber: '2026-C00012',
      amount: eur(2100),
      cause: 'refund',
      tax: [{ rateLabel: 'VAT 19 %', amount: eur(335) }],
      lines: [
        { kit: 'Curlew', licence: 'personal prints', amount: eur(1600), endsRight: true },
        { kit: 'Reed Bunting', licence: 'classroom', amount: eur(500), endsRight: false },
      ],
      endedKits: ['Curlew'],
      keptKits: ['Reed Bunting'],
      couponCode: 'FIRSTWIND',
      orderLink: 'https://saltmarsh.example/orders/W-2026-0417',
    },
  },
  {
    title: 'Refund by a dispute',
    message: {
      template: 'order-refunded',
      orderNumber: 'W-2026-0420',
      receiptNumber: '2026-000394',
      creditNoteNumber: '2026-C00013',
      cause: 'dispute',
      amount: eur(2400),
      tax: [{ rateLabel: 'VAT 22 %', amount: eur(433) }],
      lines: [{ kit: 'Curlew', licence: 'personal prints', amount: eur(2400), endsRight: true }],
      endedKits: ['Curlew'],
      orderLink: 'https://saltmarsh.example/orders/W-2026-0420',
    },
  },
  ...(['open', 'lost', 'won', 'inquiry', 'closed'] as const).map((stand) => ({
    title: `Dispute, ${stand}`,
    message: {
      template: 'payment-disputed' as const,
      name: 'Ines',
      orderNumber: 'W-2026-0420',
      buyer: 'whimbrel@mail.example',
      stand,
      amount: eur(2400),
      reason: 'product_not_received',
      answerBy: '2026-12-10T14:40:00Z',
      orderLink: 'https://saltmarsh.example/workshop/orders/W-2026-0420',
    },
  })),
  {
    title: 'Staff invitation',
    message: {
      template: 'staff-invite',
      name: 'Sedge',
      role: 'helper',
      invitedBy: 'Marlow',
      link: `https://saltmarsh.example/invited/${token}`,
      days: 7,
    },
  },
  {
    title: 'New revision, with parts to reprint',
    message: {
      template: 'revision-released',
      name: 'Wren',
      kit: 'Curlew',
      from: 'Mk 1.2',
      to: 'Mk 1.4',
      reprint: [
        { code: 'J-01', name: 'Locking tongue', quantity: 2, why: 'Too tight in PETG on most printers.' },
        {
          code: 'R-01',
          name: 'Lip rail',
          quantity: 1,
          why: 'Reprint if it troubles you: whistles in the top octave.',
        },
      ],
      link: 'https://saltmarsh.example/shelf/curlew',
      kitColourHex: '#e97c48',
      stopLink: `https://saltmarsh.example/quiet/${token}`,
    },
  },
  {
    title: 'New revision, nothing to reprint',
    message: {
      template: 'revision-released',
      kit: 'Curlew',
      from: 'Mk 1.4',
      to: 'Mk 1.5',
      reprint: [],
      link: 'https://saltmarsh.example/shelf/curlew',
    },
  },
  {
    title: 'A revision withdrawn',
    message: {
      template: 'revision-withdrawn',
      kit: 'Curlew',
      revision: 'Mk 1.3',
      reason: 'The foot breaks when the bellows are full. Do not play it standing.',
      newest: 'Mk 1.2',
      link: 'https://saltmarsh.example/shelf/curlew',
    },
  },
  {
    title: 'Gift',
    message: {
      template: 'gift-received',
      name: 'Wren',
      from: 'Marlow',
      kits: [{ kit: 'Curlew', licence: 'personal prints', revision: 'Mk 1.4' }],
      note: 'For the long evenings. I shall want to hear it in spring.',
      link: page,
      linkDays: 90,
      linkUses: 5,
      cautionsLine,
    },
  },
  ...samplePledges,
  {
    title: 'Fit report answered',
    message: {
      template: 'fit-answered',
      name: 'Wren',
      kit: 'Curlew',
      revision: 'Mk 1.0',
      part: 'H-03 Stopper',
      by: 'Odo',
      text: 'Thank you for measuring. Take the + clearance for now: it is 0.1 mm smaller on each side.\n\nThe next issue moves the middle one.',
      link: 'https://saltmarsh.example/shelf/curlew/fit',
    },
  },
  {
    title: 'Fit report mended',
    message: {
      template: 'fit-fixed',
      name: 'Wren',
      kit: 'Curlew',
      revision: 'Mk 1.0',
      part: 'H-03 Stopper',
      fixedIn: 'Mk 1.1',
      link: 'https://saltmarsh.example/shelf/curlew',
    },
  },
  {
    title: 'Confirm the news',
    message: {
      template: 'confirm-news',
      link: `https://saltmarsh.example/news/confirm#token=${token}`,
      days: 7,
    },
  },
  {
    title: 'Letter about a fix, with a reprint list',
    message: {
      template: 'letter-test',
      content: letterContent({
        kind: 'service',
        subject: 'Curlew: the locking tongue, mended',
        preheader: 'Two pieces to reprint on your build.',
        kit: 'Curlew',
        accountLink: 'https://saltmarsh.example/account',
        blocks: [
          { kind: 'paragraph', text: 'Hello Wren,' },
          {
            kind: 'paragraph',
            text: 'You hold Mk 1.2. Some of you found the locking tongue too tight in PETG. Mk 1.4 mends it. On your build, these are to be printed again:',
          },
          ...reprintBlocks(
            [
              {
                code: 'J-01',
                name: 'Locking tongue',
                quantity: 2,
                why: 'Too tight in PETG on most printers.',
                isOnlyIfItTroubles: false,
              },
              {
                code: 'R-01',
                name: 'Lip rail',
                quantity: 1,
                why: 'Whistles in the top octave.',
                isOnlyIfItTroubles: true,
              },
            ],
            '#e97c48',
          ),
          {
            kind: 'button',
            label: 'Get the files',
            link: 'https://saltmarsh.example/shelf/curlew',
          },
        ],
      }),
    },
  },
  {
    title: 'News letter',
    message: {
      template: 'letter-test',
      content: letterContent({
        kind: 'news',
        subject: 'Turnstone is on the bench',
        preheader: 'Ten strings, one evening of printing.',
        accountLink: 'https://saltmarsh.example/account',
        stopLink: `https://saltmarsh.example/unsubscribe/${token}`,
        blocks: [
          { kind: 'paragraph', text: 'Ten strings, one evening of printing. It goes out to testers in May.' },
        ],
      }),
    },
  },
];
