import type { NoteBlock, NoteSpan } from './note-blocks.js';
import { inks, mm } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { writeTable } from '../../typesetting/table.js';
import type { TextLine, TextStyle } from '../../typesetting/text-lines.js';
import { styles } from '../../typesetting/text-styles.js';

export interface NotesPlace {
  readonly x: number;
  readonly width: number;
}
export interface NotesContext {
  readonly pictures: ReadonlyMap<string, Buffer>;
  /** Codes of the parts that have a place on the parts sheet to lead to. */
  readonly drawnCodes: ReadonlySet<string>;
  /** Of headings within the notes: one below what they stand under. */
  readonly headingTag: 'H2' | 'H3';
}

const indent = mm(5);
const paragraphGap = 6;
const mostPictureHeight = mm(90);

/** Writes notes down the page. Headings within them are set one size, below that of steps and sections. */
export const writeNotes = (
  sheet: Sheet,
  blocks: readonly NoteBlock[],
  place: NotesPlace,
  context: NotesContext,
): void => {
  blocks.forEach((block, at) => {
    if (at > 0) sheet.y += block.kind === 'heading' ? 2 * paragraphGap : paragraphGap;
    writeBlock(sheet, block, place, context);
  });
};

export const withPlaces = (spans: readonly NoteSpan[], { drawnCodes }: NotesContext): NoteSpan[] =>
  spans.map((span) =>
    span.code !== undefined && drawnCodes.has(span.code) ? { ...span, goTo: partPlace(span.code) } : span,
  );

/** The name of a part's place on the parts sheet. */
export const partPlace = (code: string): string => `part-${code}`;

const writeBlock = (sheet: Sheet, block: NoteBlock, place: NotesPlace, context: NotesContext): void => {
  switch (block.kind) {
    case 'heading':
      sheet.ensure(styles.subheading.leading + 2 * styles.body.leading);
      writeText(sheet, context.headingTag, withPlaces(block.spans, context), styles.subheading, place);
      sheet.y += -paragraphGap + 2;
      return;
    case 'paragraph':
      writeText(sheet, 'P', withPlaces(block.spans, context), styles.body, place);
      return;
    case 'list':
      sheet.group('L', () => writeList(sheet, block, place, context));
      return;
    case 'quote':
      sheet.group('BlockQuote', () =>
        writeNotes(sheet, block.blocks, { x: place.x + indent, width: place.width - indent }, context),
      );
      return;
    case 'code':
      writeText(sheet, 'Code', [{ text: block.text.replaceAll(' ', '\u00a0') }], styles.table, {
        x: place.x + indent,
        width: place.width - indent,
      });
      return;
    case 'table':
      writeNotesTable(sheet, block.rows, place, context);
      return;
    case 'picture':
      writePicture(sheet, block, place, context);
      return;
    case 'rule':
      sheet.rule(place.x, sheet.y + paragraphGap, place.width);
      sheet.y += 2 * paragraphGap;
  }
};

const writeText = (
  sheet: Sheet,
  tag: string,
  spans: readonly NoteSpan[],
  style: TextStyle,
  place: NotesPlace,
): void => {
  const lines: TextLine[] = sheet.lines(spans, style, place.width);
  if (lines.length > 0) sheet.block(tag, () => sheet.write(lines, style, place));
};

const writeList = (
  sheet: Sheet,
  { start, items }: Extract<NoteBlock, { kind: 'list' }>,
  place: NotesPlace,
  context: NotesContext,
): void => {
  items.forEach((blocks, at) => {
    if (at > 0) sheet.y += paragraphGap / 2;
    sheet.ensure(2 * styles.body.leading);
    sheet.group('LI', () => {
      const label = start === null ? '•' : `${start + at}.`;
      sheet.block('Lbl', () => {
        sheet.put(label, styles.body, { x: place.x, width: indent - 4, align: 'left' }, sheet.y);
      });
      sheet.group('LBody', () =>
        writeNotes(sheet, blocks, { x: place.x + indent, width: place.width - indent }, context),
      );
    });
  });
};

const writeNotesTable = (
  sheet: Sheet,
  rows: Extract<NoteBlock, { kind: 'table' }>['rows'],
  place: NotesPlace,
  context: NotesContext,
): void => {
  const [head = [], ...rest] = rows;
  const width = place.width / Math.max(1, head.length);
  writeTable(sheet, {
    x: place.x,
    columns: head.map((title) => ({ title: title.map(({ text }) => text).join(''), width })),
    rows: rest.map((row) => head.map((_, at) => withPlaces(row[at] ?? [], context))),
  });
};

const writePicture = (
  sheet: Sheet,
  { name, alt }: Extract<NoteBlock, { kind: 'picture' }>,
  place: NotesPlace,
  { pictures }: NotesContext,
): void => {
  const picture = openPicture(sheet, pictures.get(name));
  if (!picture) {
    const words = alt === '' ? name : `${alt} (${name})`;
    writeText(
      sheet,
      'P',
      [{ text: `Picture: ${words}`, face: 'italic', colour: inks.soft }],
      styles.body,
      place,
    );
    return;
  }
  // 150 dots to the inch at least: a small picture is not blown up.
  const scale = Math.min(72 / 150, place.width / picture.width, mostPictureHeight / picture.height);
  const [width, height] = [picture.width * scale, picture.height * scale];
  sheet.ensure(height + (alt === '' ? 0 : styles.label.leading + 3));
  sheet.block(
    'Figure',
    () => {
      sheet.doc.image(picture as unknown as Buffer, place.x, sheet.y, { width, height });
    },
    alt === '' ? name : alt,
  );
  sheet.y += height;
  if (alt !== '' && sheet.roomLeft > 0) {
    sheet.y += 3;
    writeText(sheet, 'Caption', [{ text: alt }], styles.label, place);
  }
};

/** Null for what is missing or no sound PNG or JPEG: a book without one picture is better than no book. */
const openPicture = (
  { doc }: Sheet,
  bytes: Buffer | undefined,
): { readonly width: number; readonly height: number } | null => {
  if (!bytes) return null;
  try {
    const picture = (
      doc as unknown as {
        openImage(bytes: Buffer): { width: number; height: number; obj: unknown; embed(doc: unknown): void };
      }
    ).openImage(bytes);
    if (!(picture.width > 0 && picture.height > 0)) return null;
    if (!picture.obj) picture.embed(doc);
    return picture;
  } catch {
    return null;
  }
};
