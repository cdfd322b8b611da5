import { execFileSync } from 'node:child_process';
import { deflateSync, crc32 } from 'node:zlib';
import type { PrintSpecification } from '@windchest/contracts';
import type { BookPart, BookVoice, BuildBook } from './build-book.js';
import { page } from '../../typesetting/page-geometry.js';
import { typesetBuildBook } from './typeset-build-book.js';

const printSpec: PrintSpecification = {
  nozzleMm: 0.4,
  layerMm: 0.2,
  perimeters: 2,
  topLayers: 4,
  bottomLayers: 4,
  infill: 0.15,
  material: 'PETG',
  supports: 'none',
  remarks: 'Seam to the back of the pipes.',
};

const part = (code: string, over: Partial<BookPart> = {}): BookPart => ({
  code,
  name: `Pipe of ${code}`,
  quantity: 1,
  isGauge: false,
  clearances: [],
  orientation: 'may-turn',
  sizeMm: [14, 14, 160.25],
  volumeCm3: 9.4,
  drawing: {
    path: 'M0 0l14 0 0 160-14 0z',
    edges: 'M0 20l14 0',
    viewBox: '0 0 14 160',
    widthMm: 14,
    heightMm: 160,
  },
  printSpec: null,
  ...over,
});
const voice = (code: string, note: string, lengthMm: number): BookVoice => ({
  code,
  note,
  kind: 'stopped-pipe',
  dimensions: 'bore 11 mm, wall 1.6 mm',
  lengthMm,
  widthMm: 14.2,
  predicted: { hz: 554.4, cents: -0.34, uncertaintyCents: 78.4 },
});
const book = (over: Partial<BuildBook> = {}): BuildBook => ({
  workshop: { name: 'Tidewrack Works' },
  kit: {
    name: 'Curlew',
    slug: 'curlew',
    tagline: 'A pan flute that locks without glue.',
    colourHex: '#d76528',
  },
  revision: { label: 'Mk 1.4', releasedAt: new Date('2026-11-12T09:30:00Z') },
  declaredCents: 5,
  room: { temperatureC: 21 },
  buildVolume: { xMm: 220, yMm: 220, zMm: 250 },
  compass: 'C5–C♯5',
  parts: [
    part('P-72'),
    part('P-73', { quantity: 3 }),
    part('S-01', { printSpec: { ...printSpec, perimeters: 3, infill: 1, remarks: 'Print it solid.' } }),
  ],
  voices: [voice('P-72', 'C5', 160.19), voice('P-73', 'C#5', 150.98)],
  printSpec,
  hardware: [
    { quantity: 9, unit: '', name: 'M3 × 10 mm screw', remark: 'Three for each rail' },
    { quantity: 1.5, unit: 'm', name: 'Cord, 3 mm', remark: '' },
  ],
  assemblyNotes: [
    '## 1. Print',
    'Print [[P-72]] and [[S-01]] upright ± a little, then **let them cool**.',
    '## 2. Lock the row',
    'Push [[P-73]] home:\n\n- by hand\n- not with a *hammer*',
  ].join('\n\n'),
  changeNotes: '### Fixed\n\n- [[P-73]] is 0.12 mm narrower.',
  cautions: '## Printing\n\nAir the room.',
  ...over,
});

const read = (pdf: Buffer, ...options: string[]): string =>
  execFileSync('pdftotext', [...options, '-', '-'], { input: pdf, encoding: 'utf8', maxBuffer: 1e8 });
const words = (pdf: Buffer): string => read(pdf).replaceAll(/\s+/g, ' ');
const pageCountOf = (pdf: Buffer): number =>
  Number(/^Pages:\s+(\d+)/m.exec(execFileSync('pdfinfo', ['-'], { input: pdf, encoding: 'utf8' }))?.[1]);

interface Word {
  page: number;
  text: string;
  left: number;
  right: number;
  top: number;
  bottom: number;
}
const wordsOnPages = (pdf: Buffer): Word[] =>
  read(pdf, '-bbox')
    .split('<page ')
    .slice(1)
    .flatMap((one, at) =>
      [...one.matchAll(/<word xMin="(.+?)" yMin="(.+?)" xMax="(.+?)" yMax="(.+?)">(.*?)<\/word>/g)].map(
        ([, left, top, right, bottom, text]) => ({
          page: at + 1,
          text: text ?? '',
          left: Number(left),
          right: Number(right),
          top: Number(top),
          bottom: Number(bottom),
        }),
      ),
    );
/** Readers give a word the height of its font, a little more than that of its letters. */
const slack = 4;
const strayWords = (pdf: Buffer): Word[] =>
  wordsOnPages(pdf).filter(({ page: number, left, right, top, bottom }) => {
    const isInFoot = top > page.foot - slack && bottom < page.foot + 10 + slack;
    const isInTitleBlock = number === 1 && bottom < page.foot + 1;
    const isInside = top > page.top - 10 && (bottom < page.bottom + slack || isInFoot || isInTitleBlock);
    return !(isInside && left > page.edge - slack && right < page.right + slack);
  });

describe('typesetBuildBook', () => {
  it('gives the same bytes for the same book, and others for another', async () => {
    const [first, second] = [await typesetBuildBook(book()), await typesetBuildBook(book())];
    expect(first.subarray(0, 5).toString()).toBe('%PDF-');
    expect(second.equals(first)).toBe(true);
    expect((await typesetBuildBook(book({ declaredCents: 6 }))).equals(first)).toBe(false);
  });

  it('names the document, its language and its date, and is tagged', async () => {
    const pdf = await typesetBuildBook(book());
    const info = execFileSync('pdfinfo', ['-isodates', '-'], { input: pdf, encoding: 'utf8' });
    expect(info).toMatch(/^Title: +Curlew Mk 1\.4: build book$/m);
    expect(info).toMatch(/^Author: +Tidewrack Works$/m);
    expect(info).toMatch(/^CreationDate: +2026-11-12T09:30:00Z$/m);
    expect(info).toMatch(/^Tagged: +yes$/m);
    expect(info).toMatch(/^Page size: +595\.\d+ x 841\.\d+ pts \(A4\)$/m);
    expect(pdf.toString('latin1')).toContain('/Lang (en-GB)');
  });

  it('tells the structure: headings, lists, tables, and figures with words for who cannot see them', async () => {
    const structure = execFileSync('pdfinfo', ['-struct-text', '-'], {
      input: await typesetBuildBook(book()),
      encoding: 'utf8',
    });
    for (const tag of ['H1', 'H2', 'P ', 'Table', 'TH', 'TD', 'L ', 'LI', 'Figure'])
      expect(structure).toContain(tag);
    expect(structure).toMatch(/H2 \(block\)\s+"1Print"/);
  });

  it('states revision, date, compass, declared cents, sheet and scale in the title block', async () => {
    const pdf = await typesetBuildBook(book());
    const cover = read(pdf, '-l', '1', '-layout').replaceAll(/ +/g, ' ');
    for (const fact of [
      'Mk 1.4',
      '12 November 2026',
      'C5–C♯5',
      '± 5 cents',
      'Declared at 21 °C',
      '220 × 220 × 250 mm',
      'curlew-mk-1.4',
      `1 of ${pageCountOf(pdf)}`,
      '5 pieces',
    ])
      expect(cover).toContain(fact);
    // 160.19 mm at 1 : 1.5 would be 107 mm, more than the page has left for it.
    expect(cover).toMatch(/curlew-mk-1\.4 1 ?: ?2 /);
    // The longest voice, along its dimension line.
    expect(cover).toContain('160.2');
  });

  it('lists the sections with the pages they stand on', async () => {
    const pdf = await typesetBuildBook(book());
    const cover = read(pdf, '-l', '1', '-layout');
    for (const title of ['Parts sheet', 'Hardware', 'Cautions', 'Assembly', 'Voicing', 'Change notes']) {
      const told = Number(new RegExp(`${title} +(\\d+)`).exec(cover)?.[1]);
      expect(read(pdf, '-f', String(told), '-l', String(told))).toContain(title);
    }
  });

  it('holds every part, every thing to buy, every step, the cautions and the changes', async () => {
    const text = words(await typesetBuildBook(book()));
    for (const told of [
      'Pipe of P-72',
      'Pipe of P-73',
      '14.0 × 14.0 × 160.3',
      'S-01 (a in the list of parts): Perimeters 3, infill 100 %. Print it solid.',
      'M3 × 10 mm screw',
      'Three for each rail',
      '1.5 m',
      'Cord, 3 mm',
      'Seam to the back of the pipes.',
      'Print P-72 and S-01 upright ± a little, then let them cool.',
      'Lock the row',
      'not with a hammer',
      'Air the room.',
      'P-73 is 0.12 mm narrower.',
    ])
      expect(text).toContain(told);
    expect(text).not.toContain('tighter');
  });

  it('names the gauge to print first, and the file of every clearance', async () => {
    const files = (['minus', 'zero', 'plus'] as const).map((clearance) => ({
      clearance,
      fileName: `S-01 Stopper (${clearance}).stl`,
    }));
    const parts = [
      part('G-01', { name: 'Stopper gauge', isGauge: true }),
      part('S-01', { name: 'Stopper', clearances: files }),
    ];
    const pdf = await typesetBuildBook(book({ parts, assemblyNotes: '', voices: [] }));
    const text = words(pdf);
    for (const told of [
      'Print the gauge first, G-01 Stopper gauge. See which of its clearances fits, then print all parts below in that one.',
      '− tighter S-01 Stopper (minus).stl',
      '0 as drawn S-01 Stopper (zero).stl',
      '+ looser S-01 Stopper (plus).stl',
    ])
      expect(text).toContain(told);
    expect(strayWords(pdf)).toEqual([]);
    expect(text).not.toContain('[[');
  });

  it('holds every voice with length, pitch, cents and how sure they are, and the room they hold for', async () => {
    const text = read(await typesetBuildBook(book()), '-layout').replaceAll(/ +/g, ' ');
    expect(text).toContain('C5 P-72 Stopped pipe, bore 11 mm, wall 1.6 mm 160.19 554.4 −0.3 ± 78');
    expect(text).toContain('C♯5 P-73 Stopped pipe, bore 11 mm, wall 1.6 mm 150.98 554.4 −0.3 ± 78');
    expect(text).toContain('Computed for a room of 21 °C');
  });

  it('has bookmarks for the sections and the steps', async () => {
    const raw = (await typesetBuildBook(book())).toString('latin1');
    for (const title of ['Parts sheet', 'Assembly', '1  Print', '2  Lock the row', 'Voicing'])
      expect(raw).toContain(`/Title (${title})`);
  });

  it('leads from a part code in the notes to its drawing', async () => {
    const raw = (await typesetBuildBook(book())).toString('latin1');
    expect(raw).toMatch(/\/S \/GoTo\s+\/D \(part-P-73\)/);
    expect(raw).toMatch(/\(part-P-73\) \[/);
  });

  it('keeps all words within the margins', async () => {
    expect(strayWords(await typesetBuildBook(book()))).toEqual([]);
  });

  it('goes on over as many pages as long notes and sixty parts need', async () => {
    const parts = Array.from({ length: 60 }, (_, at) =>
      part(`P-${at + 10}`, { name: 'A part '.repeat(15).trim() }),
    );
    const step = (at: number) =>
      `## Step ${at}: turn\n\n${parts.map(({ code }) => `[[${code}]]`).join(' ')}\n\n${'Words that go on. '.repeat(120)}end-of-${at}.`;
    const long = book({
      parts,
      voices: parts.map(({ code }, at) => voice(code, `C${at % 8}`, 20 + at)),
      hardware: Array.from({ length: 90 }, (_, at) => ({
        quantity: at + 1,
        unit: '',
        name: `Screw number ${at}`,
        remark: 'x'.repeat(300),
      })),
      assemblyNotes: Array.from({ length: 12 }, (_, at) => step(at)).join('\n\n'),
      cautions: 'Mind this. '.repeat(1500),
    });
    const pdf = await typesetBuildBook(long);
    const text = words(pdf);
    expect(pageCountOf(pdf)).toBeGreaterThan(25);
    for (const { code } of parts) expect(text).toContain(code);
    for (let at = 0; at < 12; at += 1) expect(text).toContain(`end-of-${at}.`);
    for (let at = 0; at < 90; at += 1) expect(text).toContain(`Screw number ${at} `);
    expect(text.match(/\bMind\b/g)).toHaveLength(1500);
    expect(strayWords(pdf)).toEqual([]);
    expect((await typesetBuildBook(long)).equals(pdf)).toBe(true);
  });

  it('does without drawings, sizes, predictions, hardware and notes', async () => {
    const bare = await typesetBuildBook(
      book({
        parts: [part('P-72', { drawing: null, sizeMm: null, volumeCm3: null })],
        voices: [{ ...voice('P-72', 'C5', 160), lengthMm: null, predicted: null, kind: 'vessel' }],
        hardware: [],
        assemblyNotes: '',
        changeNotes: '',
        cautions: '',
      }),
    );
    const text = words(bare);
    expect(text).toContain('No part has a drawing.');
    expect(text).toContain('Nothing but the printed parts.');
    expect(text).toContain('not computed');
    expect(text).not.toContain('Assembly');
    const empty = await typesetBuildBook(book({ parts: [], voices: [], compass: '' }));
    expect(words(empty)).toContain('No voices');
    expect(strayWords(empty)).toEqual([]);
  });

  it('names the parts that have no drawing beside those that have one', async () => {
    const text = words(
      await typesetBuildBook(book({ parts: [part('P-72'), part('X-09', { drawing: null })] })),
    );
    expect(text).toContain('Not drawn: X-09.');
  });

  it('prints letters of other scripts, and signs no font has, so that they can be read back', async () => {
    const pdf = await typesetBuildBook(
      book({ cautions: 'Łódź, Ωμέγα, Привет, tiếng Việt, F♯4 → B♭4, ⌀ 3 mm, ≤ 5, 木 and 🎵.' }),
    );
    expect(words(pdf)).toContain('Łódź, Ωμέγα, Привет, tiếng Việt, F♯4 → B♭4, ⌀ 3 mm, ≤ 5, 木 and 🎵.');
    expect(strayWords(pdf)).toEqual([]);
  });

  it('breaks names and words that are wider than their place', async () => {
    const pdf = await typesetBuildBook(
      book({
        kit: { name: 'N'.repeat(60), slug: 'n'.repeat(60), tagline: 'T'.repeat(200), colourHex: '#333333' },
        workshop: { name: 'W'.repeat(120) },
        assemblyNotes: `## ${'H'.repeat(200)}\n\n${'p'.repeat(900)}\n\n| a | b |\n| - | - |\n| ${'c'.repeat(200)} | d |`,
        parts: [part('ABC-123a', { name: 'L'.repeat(120), quantity: 999 })],
      }),
    );
    expect(strayWords(pdf)).toEqual([]);
  });

  it('sets the pictures of the notes, and names those it cannot set', async () => {
    const pictures = new Map([
      ['row.png', png(2)],
      ['clear.png', png(6)],
      ['broken.png', png(2).subarray(0, 20)],
    ]);
    const assemblyNotes =
      '## Look\n\n![The row](pictures/row.png)\n\n![Clear](clear.png)\n\n![Torn](broken.png)\n\n![Gone](no.webp)';
    const pdf = await typesetBuildBook(book({ assemblyNotes, pictures }));
    const images = execFileSync('pdfimages', ['-list', '-'], { input: pdf, encoding: 'utf8' });
    expect(images.match(/^ +\d+ +\d+ image /gm)).toHaveLength(2);
    const text = words(pdf);
    expect(text).toContain('The row');
    expect(text).toContain('Picture: Torn (broken.png)');
    expect(text).toContain('Picture: Gone (no.webp)');
    expect((await typesetBuildBook(book({ assemblyNotes, pictures }))).equals(pdf)).toBe(true);
  });

  it('refuses a colour that is none', async () => {
    const kit = { ...book().kit, colourHex: 'orange' };
    await expect(typesetBuildBook(book({ kit }))).rejects.toThrow(
      '"orange" is no colour: write it as #rrggbb.',
    );
  });
});

/** A PNG of 40 × 20 pixels (PNG, third edition: colour type 2 is RGB, 6 RGB with alpha). */
const png = (colourType: 2 | 6): Buffer => {
  const chunk = (name: string, data: Buffer): Buffer => {
    const body = Buffer.concat([Buffer.from(name, 'latin1'), data]);
    const ends = Buffer.alloc(8);
    ends.writeUInt32BE(data.length, 0);
    ends.writeUInt32BE(crc32(body), 4);
    return Buffer.concat([ends.subarray(0, 4), body, ends.subarray(4)]);
  };
  const head = Buffer.from([0, 0, 0, 40, 0, 0, 0, 20, 8, colourType, 0, 0, 0]);
  const rows = Buffer.alloc(20 * (1 + 40 * (colourType === 2 ? 3 : 4)), 0x40);
  for (let row = 0; row < 20; row += 1) rows[row * (rows.length / 20)] = 0;
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', head),
    chunk('IDAT', deflateSync(rows)),
    chunk('IEND', Buffer.alloc(0)),
  ]);
};
