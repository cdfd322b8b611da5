import { collectBytes, openDocument } from '../../typesetting/open-document.js';
import type { BuildBook } from './build-book.js';
import { kitShades } from './kit-shades.js';
import { readNotes } from './read-notes.js';
import { contentWidth, mm, page, textWidth } from '../../typesetting/page-geometry.js';
import { Sections } from './sections.js';
import { BookSheet } from './book-sheet.js';
import { styles } from '../../typesetting/text-styles.js';
import { Typeface } from '../../typesetting/typeface.js';
import { readFontFiles } from '../../typesetting/typeface-files.js';
import { writeAssembly } from './write-assembly.js';
import { hasClearances, writeClearances } from './write-clearances.js';
import { writeContents } from './write-contents.js';
import { contentsTop, writeCover } from './write-cover.js';
import { writeHardware, writePartsList, writePrintSpecification, writeVoicing } from './write-lists.js';
import { writeNotes, type NotesContext } from './write-notes.js';
import { drawnParts, writePartsSheet } from './write-parts-sheet.js';
import { drawBookBlock } from './write-title-block.js';

/**
 * Typesets a kit's build book: a tagged PDF, A4. The same book gives the same bytes. Reads no files but those of
 * its typeface.
 */
export const typesetBuildBook = async (book: BuildBook): Promise<Buffer> => {
  const doc = openBook(book);
  const bytes = collectBytes(doc);
  const sheet = new BookSheet(doc, new Typeface(doc, await readFontFiles()), kitShades(book.kit.colourHex));
  const writeFirstPageRest = writeBook(sheet, book);
  doc.switchToPage(0);
  writeFirstPageRest();
  writeFeet(sheet, book);
  doc.end();
  return bytes;
};

const openBook = ({ kit, revision, workshop }: BuildBook): PDFKit.PDFDocument =>
  openDocument({
    title: `${kit.name} ${revision.label}: build book`,
    author: workshop.name,
    subject: kit.tagline,
    date: revision.releasedAt,
  });

/** Writes all but what must know the number of pages; returns how to write that on the first page. */
const writeBook = (sheet: BookSheet, book: BuildBook): (() => void) => {
  const sections = new Sections(sheet);
  const notesPlace = { x: page.left, width: textWidth };
  const context: NotesContext = {
    pictures: book.pictures ?? new Map<string, Buffer>(),
    drawnCodes: new Set(drawnParts(book.parts).map(({ code }) => code)),
    headingTag: 'H2',
  };
  const scale = writeCover(sheet, book);
  const fillFirstPage = sheet.reserve('Sect');
  sheet.newPage();

  if (book.parts.length > 0) {
    sections.write('Parts sheet', { least: 0, isOnNewPage: true }, () => writePartsSheet(sheet, book.parts));
    if (hasClearances(book.parts))
      sections.write('Clearance', { least: mm(60) }, () => writeClearances(sheet, book.parts));
    sections.write('Parts to print', { least: mm(50) }, () => writePartsList(sheet, book));
  }
  sections.write('Hardware', { least: mm(35) }, () => writeHardware(sheet, book));
  sections.write('Print specification', { least: mm(75) }, () => writePrintSpecification(sheet, book));
  writeProse('Cautions', book.cautions);
  if (book.assemblyNotes.trim() !== '')
    sections.write('Assembly', { least: mm(110) }, () => {
      if (context.drawnCodes.size > 0) {
        sheet.block('P', () => {
          sheet.y += sheet.put(
            'Drawings beside the steps are not to scale; those of the parts sheet are.',
            styles.lead,
            { x: page.left, width: contentWidth },
            sheet.y,
          );
        });
        sheet.y += 12;
      }
      writeAssembly(sheet, sections, readNotes(book.assemblyNotes), book.parts, context);
    });
  if (book.voices.length > 0) sections.write('Voicing', { least: mm(60) }, () => writeVoicing(sheet, book));
  writeProse('Change notes', book.changeNotes);

  const pageCount = sheet.pageCount;
  return () =>
    fillFirstPage(() => {
      writeContents(sheet, sections.written, contentsTop);
      drawBookBlock(sheet, book, { scale, pageCount });
    });

  function writeProse(title: string, markdown: string): void {
    if (markdown.trim() === '') return;
    sections.write(title, { least: mm(30) }, () =>
      writeNotes(sheet, readNotes(markdown), notesPlace, context),
    );
  }
};

/** The running foot; the first page has its title block instead. */
const writeFeet = (sheet: BookSheet, { kit, revision, workshop }: BuildBook): void => {
  const { doc, pageCount } = sheet;
  const place = { x: page.left, width: contentWidth };
  for (let at = 1; at < pageCount; at += 1) {
    doc.switchToPage(at);
    doc.markContent('Artifact', { type: 'Pagination' });
    sheet.putOneLine(
      [
        { text: `${kit.name} ${revision.label}`, face: 'semibold' },
        { text: `, build book. ${workshop.name}` },
      ],
      styles.foot,
      { ...place, width: contentWidth - 60 },
      page.foot,
    );
    sheet.put(`${at + 1} of ${pageCount}`, styles.foot, { ...place, align: 'right' }, page.foot);
    doc.endMarkedContent();
  }
};
