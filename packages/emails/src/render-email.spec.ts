import { money } from '@windchest/money';
import {
  renderContent,
  renderEmail,
  type EmailMessage,
  type EmailTemplate,
  type EmailWorkshop,
} from './index.js';
import { sampleMessages, sampleWorkshop } from './preview-page/sample-messages.js';

type MessageOf<T extends EmailTemplate> = Extract<EmailMessage, { template: T }>;

/** The first sample of a template, with what the test is about put in. */
function sampleOf<T extends EmailTemplate>(template: T, changes: Partial<MessageOf<T>> = {}): MessageOf<T> {
  const found = sampleMessages.find(({ message }) => message.template === template);
  if (!found) throw new Error(`No sample of ${template}.`);
  return { ...(found.message as MessageOf<T>), ...changes };
}

/** The words of an HTML mail as a reader meets them: tags away, entities back, spaces plain. */
const wordsOf = (html: string): string =>
  html
    .replace(/<style>[\s\S]*?<\/style>/g, '')
    .replace(/<[^>]+>/g, ' ')
    .replace(/&lt;/g, '<')
    .replace(/&gt;/g, '>')
    .replace(/&quot;/g, '"')
    .replace(/&#39;/g, "'")
    .replace(/&amp;/g, '&')
    .replace(/\s+/g, ' ');

const unwrapped = (text: string): string => text.replace(/^> ?/gm, '').replace(/\s+/g, ' ');

/** Every web address anywhere in a message. */
const linksOf = (value: unknown): string[] => {
  if (typeof value === 'string') return value.startsWith('https://') ? [value] : [];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(linksOf) : [];
};

describe.each(sampleMessages)('the mail "$title"', ({ message }) => {
  const { subject, html, text } = renderEmail(message, sampleWorkshop);

  it('has a subject of one line that a mail list can show', () => {
    expect(subject).toMatch(/^[^\p{Cc}\u00a0]{10,70}$/u);
  });

  it('carries every link in both forms, whole and on its own line in the text', () => {
    const links = linksOf(message);
    expect(links.length).toBeGreaterThan(0);
    for (const link of links) {
      expect(html).toContain(`href="${link}"`);
      expect(text.split('\n')).toContain(link);
    }
  });

  it('keeps the lines of the text within 78 characters, links apart', () => {
    const long = text.split('\n').filter((line) => line.length > 78 && !line.startsWith('https://'));
    expect(long).toEqual([]);
  });

  it('says in the text what the HTML says', () => {
    const heading = /<h1[^>]*>(.*?)<\/h1>/.exec(html)?.[1];
    const paragraphs = [...html.matchAll(/<p class="w-ink"[^>]*>(.*?)<\/p>/g)].map((found) => found[1] ?? '');
    for (const said of [heading ?? 'no heading', ...paragraphs]) {
      expect(unwrapped(text)).toContain(wordsOf(said).trim());
    }
  });

  it('asks for nothing from the network and runs nothing', () => {
    expect(html).not.toMatch(/<(img|script|link|iframe|object|form)\b|@import|url\(|\son\w+=/i);
  });

  it('has no exclamation mark and leaves nothing unfilled', () => {
    expect(wordsOf(html)).not.toMatch(/!|undefined|NaN|\[object/);
    expect(text).not.toMatch(/!|undefined|NaN|\[object/);
  });

  it('says why it came and from whom', () => {
    for (const form of [wordsOf(html), unwrapped(text)]) {
      expect(form).toContain('You get this because');
      expect(form).toContain('Saltmarsh Sound Works, 3 Sluice Lane, Marshfoot');
      expect(form).toContain('Questions? Write to bench@saltmarsh.example.');
    }
  });
});

it('has a sample of every template, so that the checks above miss none', () => {
  const templates: Record<EmailTemplate, true> = {
    'verify-address': true,
    'sign-in-link': true,
    'reset-passphrase': true,
    'address-already-joined': true,
    'passphrase-changed': true,
    'order-paid': true,
    'new-download-link': true,
    'order-refunded': true,
    'payment-disputed': true,
    'staff-invite': true,
    'revision-released': true,
    'revision-withdrawn': true,
    'gift-received': true,
    'fit-answered': true,
    'fit-fixed': true,
    'pledge-began': true,
    'pledge-receipt': true,
    'pledge-payment-failed': true,
    'pledge-grace-ends-soon': true,
    'pledge-lapsed': true,
    'pledge-will-end': true,
    'pledge-ended': true,
    'pledge-paused': true,
    'pledge-resumes-soon': true,
    'pledge-plan-changes': true,
    'confirm-news': true,
    'letter-test': true,
  };
  expect(new Set(sampleMessages.map(({ message }) => message.template))).toEqual(
    new Set(Object.keys(templates)),
  );
});

describe('the mail of a paid order', () => {
  const { html, text } = renderEmail(sampleOf('order-paid'), sampleWorkshop);

  it('names kits, revisions, licences, amounts, tax and numbers in both forms', () => {
    for (const form of [wordsOf(html), unwrapped(text)]) {
      for (const words of [
        'Your payment of €55.00 has arrived.',
        'Mk 1.4, personal prints, €8.00 off',
        'Mk 2.0, classroom',
        'The link works for 30 days and 5 downloads.',
        'W-2026-0417',
        '2026-000391',
        'Air the room while you print.',
      ]) {
        expect(form).toContain(words);
      }
    }
  });

  it('shows lines before the discount, so that they add up to the subtotal', () => {
    for (const line of [
      'Curlew: €24.00',
      'Reed Bunting: €39.00',
      'Subtotal: €63.00',
      'Coupon FIRSTWIND: −€8.00',
      'Total: €55.00',
      'of which VAT 19 %: €8.78',
    ]) {
      expect(text.split('\n')).toContain(line);
    }
  });

  it('shows neither subtotal nor discount where nothing was taken off', () => {
    const plain = sampleOf('order-paid', { discount: undefined, couponCode: undefined });
    expect(renderEmail(plain, sampleWorkshop).text).not.toMatch(/Subtotal|Discount|Coupon/);
    const zero = sampleOf('order-paid', { discount: money(0, 'EUR') });
    expect(renderEmail(zero, sampleWorkshop).text).not.toMatch(/Subtotal|Discount|Coupon/);
  });

  it('speaks of no payment where nothing was paid', () => {
    const free = renderEmail(
      sampleOf('order-paid', {
        total: money(0, 'EUR'),
        subtotal: money(0, 'EUR'),
        discount: undefined,
        tax: [],
      }),
      sampleWorkshop,
    ).text;
    expect(free).toContain('There was nothing to pay.');
    expect(free).not.toContain('payment');
  });

  it('writes amounts as the workshop’s language does', () => {
    const { text: german } = renderEmail(sampleOf('order-paid'), { ...sampleWorkshop, locale: 'de-DE' });
    expect(german).toContain('Total: 55,00 €');
  });

  it('shortens the subject of many kits', () => {
    const [line] = sampleOf('order-paid').lines;
    if (!line) throw new Error('The sample has no line.');
    const lines = ['Curlew', 'Heron', 'Dunlin'].map((kit) => ({ ...line, kit }));
    expect(renderEmail(sampleOf('order-paid', { lines }), sampleWorkshop).subject).toBe(
      'Your files: Curlew and 2 more kits',
    );
  });
});

describe('the mail of a refund', () => {
  it('says what ends and what stays', () => {
    const text = unwrapped(renderEmail(sampleOf('order-refunded'), sampleWorkshop).text);
    expect(text).toContain('your right to the files of Curlew ends. It is no longer on your shelf.');
    expect(text).toContain('Reed Bunting stays on your shelf.');
    expect(text).toContain('Credit note: 2026-C00012');
    expect(text).toContain('The coupon FIRSTWIND that lowered the price stays used.');
  });

  it('says neither where staff keep everything as it was', () => {
    const message = sampleOf('order-refunded', { endedKits: [], keptKits: [] });
    expect(renderEmail(message, sampleWorkshop).text).not.toContain('shelf');
  });

  it('names the bank where it took the money back in a dispute', () => {
    const { subject, text } = renderEmail(sampleOf('order-refunded', { cause: 'dispute' }), sampleWorkshop);
    expect(subject).toBe('Credit note over €21.00 for order W-2026-0417');
    expect(unwrapped(text)).toContain('Your bank has given you back €21.00 that you had disputed.');
  });
});

describe('the mail of a dispute', () => {
  const text = (message: object = {}): string =>
    unwrapped(renderEmail(sampleOf('payment-disputed', message), sampleWorkshop).text);

  it('says what the bank has done, what rests and until when to answer', () => {
    expect(text()).toContain('has taken €24.00 back until it has decided. Downloads of this order rest');
    expect(text()).toContain('Reason given: product not received');
    expect(text()).toContain('Answer by: 10 December 2026');
  });

  it('asks for no answer once it is decided', () => {
    expect(text({ stand: 'won' })).toContain('€24.00 stays with the workshop.');
    expect(text({ stand: 'won' })).not.toContain('Answer by');
    expect(text({ stand: 'lost' })).toContain('A credit note is written');
  });
});

describe('the mail of a new revision', () => {
  it('names the reader’s own parts, how many, and why', () => {
    const { subject, html, text } = renderEmail(sampleOf('revision-released'), sampleWorkshop);
    expect(subject).toBe('Curlew Mk 1.4 is out, 3 pieces to reprint');
    expect(text).toContain('- J-01 Locking tongue × 2\n  Too tight in PETG on most printers.');
    expect(wordsOf(html)).toContain('J-01 Locking tongue × 2 Too tight in PETG on most printers.');
    expect(text).toContain('Stop mails about new revisions:');
  });

  it('says so where nothing needs reprinting, and offers the notes', () => {
    const { subject, text } = renderEmail(sampleOf('revision-released', { reprint: [] }), sampleWorkshop);
    expect(subject).toContain('nothing to reprint');
    expect(text).toContain('Read what changed:');
    expect(text).not.toContain('Get the changed parts');
  });

  it('wears the colour of the kit only where it is a colour', () => {
    const mark = (kitColourHex: string): string =>
      renderEmail(sampleOf('revision-released', { kitColourHex }), sampleWorkshop).html;
    expect(mark('#5cb572')).toContain('background-color:#5cb572');
    expect(mark('red;"><script>')).not.toContain('red;');
  });
});

describe('hostile input', () => {
  /** Told apart by the code, never shown. */
  const WORDS_OF_OURS = ['template', 'currency', 'stand', 'cause', 'keeps'];
  const attack = `<img src=x onerror="alert('1')">&amp;`;

  it('is escaped wherever a message or the workshop carries it', () => {
    const workshop: EmailWorkshop = {
      ...sampleWorkshop,
      name: `Salt ${attack}`,
      address: attack,
      replyTo: attack,
    };
    const poisoned = (value: unknown): unknown => {
      if (typeof value === 'string') return /^https:|^\d{4}-\d\d-\d\dT/.test(value) ? value : `x ${attack}`;
      if (Array.isArray(value)) return value.map(poisoned);
      if (typeof value !== 'object' || value === null) return value;
      return Object.fromEntries(
        Object.entries(value).map(([key, item]: [string, unknown]) => [
          key,
          WORDS_OF_OURS.includes(key) ? item : poisoned(item),
        ]),
      );
    };
    for (const { message } of sampleMessages) {
      const { html } = renderEmail(poisoned(message) as EmailMessage, workshop);
      expect(html).not.toContain('<img');
      expect(html).not.toContain('onerror="');
      expect(html).toContain('&lt;img src=x onerror=&quot;alert(&#39;1&#39;)&quot;&gt;&amp;amp;');
    }
  });

  it('adds no header and no line by control characters', () => {
    const message = sampleOf('revision-released', { kit: 'Curlew\r\nBcc: all@example.org\u202e' });
    const { subject, text } = renderEmail(message, sampleWorkshop);
    expect(subject).toBe('Curlew Bcc: all@example.org Mk 1.4 is out, 3 pieces to reprint');
    expect(text).not.toMatch(/[\r\u202e]|^Bcc/m);
  });

  it.each([
    'Win money at http://spam.example',
    'www.spam.example',
    'spam.example',
    'call@spam.example',
    'x'.repeat(61),
  ])('does not greet a stranger with "%s"', (name) => {
    const { html, text } = renderEmail(sampleOf('verify-address', { name }), sampleWorkshop);
    expect(text).toContain('\nHello,\n');
    expect(text).not.toContain(name);
    expect(html).not.toContain(name);
  });

  it.each(['Wren', 'J. Alder', 'Dr. Ó Súilleabháin', 'Anne-Marie d’Eau', '小鳥'])(
    'greets %s by name',
    (name) => {
      const { text } = renderEmail(sampleOf('verify-address', { name }), sampleWorkshop);
      expect(text).toContain(`Hello ${name},`);
    },
  );

  it.each(['javascript:alert(1)', '/relative', 'https://a.example/"onclick="x', 'data:text/html,x', ''])(
    'is refused as the link "%s"',
    (link) => {
      expect(() => renderEmail(sampleOf('sign-in-link', { link }), sampleWorkshop)).toThrow(
        'is not a web address',
      );
    },
  );

  it('cuts a word that would burst the lines of the text', () => {
    const { text } = renderEmail(sampleOf('gift-received', { note: 'o'.repeat(500) }), sampleWorkshop);
    const long = text.split('\n').filter((line) => line.length > 78 && !line.startsWith('https://'));
    expect(long).toEqual([]);
    expect(text.replace(/[^o]/g, '').length).toBeGreaterThanOrEqual(500);
  });
});

describe('a gift', () => {
  const gift = sampleMessages.find(({ title }) => title.includes('gift'))?.message;
  if (gift?.template !== 'order-paid') throw new Error('There is no sample of a gift.');

  it('tells its buyer who has the files, and hands them no link', () => {
    const { subject, html, text } = renderEmail(gift, sampleWorkshop);
    expect(subject).toBe('Your gift is on its way: Curlew');
    for (const form of [html, text]) {
      expect(form).toContain('wren@mail.example');
      expect(form).not.toContain('/get/');
      expect(form).not.toContain('download page');
      expect(form).toContain(gift.orderLink);
    }
    expect(unwrapped(text)).toContain('Reverse charge: your business owes the VAT in its own country.');
  });

  it('names all its kits to the one who gets it', () => {
    const kits = ['Curlew', 'Knot', 'Teal'].map((kit) => ({
      kit,
      licence: 'personal prints',
      revision: 'Mk 1.0',
    }));
    const { subject, text } = renderEmail(sampleOf('gift-received', { kits }), sampleWorkshop);
    expect(subject).toBe('Marlow gives you Curlew and 2 more kits');
    expect(unwrapped(text)).toContain('Marlow gives you Curlew, Knot and Teal, musical instruments');
    expect(unwrapped(text)).toContain('Knot Mk 1.0, with the licence “personal prints”.');
  });

  it('says whose rights end when it is refunded', () => {
    const { text } = renderEmail(sampleOf('order-refunded', { giftTo: 'wren@mail.example' }), sampleWorkshop);
    expect(unwrapped(text)).toContain('the right of wren@mail.example to the files of');
    expect(text).not.toContain('your shelf');
  });
});

describe('moments and counts', () => {
  it('are shown in UTC, in words', () => {
    const text = unwrapped(renderEmail(sampleOf('passphrase-changed'), sampleWorkshop).text);
    expect(text).toContain('was changed on 1 December 2026 at 14:40 UTC.');
  });

  it('are refused where they are none', () => {
    const message = sampleOf('passphrase-changed', { when: 'yesterday' });
    expect(() => renderEmail(message, sampleWorkshop)).toThrow('"yesterday" is not an instant');
  });

  it('have a singular', () => {
    const { text } = renderEmail(sampleOf('new-download-link', { linkDays: 1, linkUses: 1 }), sampleWorkshop);
    expect(text).toContain('The link works for 1 day and 1 download.');
  });
});

describe('content of one’s own', () => {
  it('stands in the same frame, in both forms', () => {
    const { subject, html, text } = renderContent(
      {
        subject: 'The tongue fix',
        preheader: 'Two tongues to reprint.',
        heading: 'Two tongues to reprint for your Curlew',
        blocks: [{ kind: 'prepared', html: '<p>Print <em>slowly</em>.</p>', text: 'Print *slowly*.' }],
        reason: 'You get this because you own Curlew.',
        stop: { label: 'Stop news', link: 'https://saltmarsh.example/quiet/1' },
      },
      sampleWorkshop,
    );
    expect(subject).toBe('The tongue fix');
    expect(html).toContain('<p>Print <em>slowly</em>.</p>');
    expect(html).toContain('href="https://saltmarsh.example/quiet/1"');
    expect(text).toContain('Print *slowly*.');
    expect(text).toContain('Stop news:\nhttps://saltmarsh.example/quiet/1');
  });
});
