import { contentWidth, inks, page } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { styles } from '../../typesetting/text-styles.js';

export interface WrittenSection {
  readonly title: string;
  readonly pageNumber: number;
  readonly place: string;
}

/** The sections of a book: each a heading, a bookmark and a line of the contents. */
export class Sections {
  readonly written: WrittenSection[] = [];
  private bookmark: PDFKit.PDFOutline | undefined;

  constructor(private readonly sheet: Sheet) {}

  /** @param least the room its start needs; a new page is taken where there is less, or always if so told. */
  write(
    title: string,
    { least, isOnNewPage = false }: { least: number; isOnNewPage?: boolean },
    write: () => void,
  ): void {
    const { sheet } = this;
    const headHeight = styles.section.leading + 20;
    if (sheet.y > page.top) {
      if (isOnNewPage || sheet.roomLeft < gap + headHeight + least) sheet.newPage();
      else sheet.y += gap;
    }
    const place = `section-${this.written.length + 1}`;
    const { doc } = sheet;
    doc.addNamedDestination(place, 'XYZ', page.edge, sheet.y - 4, 0);
    this.bookmark = this.addBookmark(doc.outline, title);
    this.written.push({ title, pageNumber: sheet.pageCount, place });
    sheet.group('Sect', () => {
      sheet.rule(page.edge, sheet.y, page.right - page.edge, inks.ink, 0.9);
      sheet.y += 9;
      sheet.block('H1', () => {
        sheet.y += sheet.put(title, styles.section, { x: page.left, width: contentWidth }, sheet.y);
      });
      sheet.y += 9;
      write();
    });
  }

  /** A bookmark below that of the section being written. */
  addPlace(title: string): void {
    if (this.bookmark) this.addBookmark(this.bookmark, title);
  }

  private addBookmark(parent: PDFKit.PDFOutline, title: string): PDFKit.PDFOutline {
    const { sheet } = this;
    // The published types know only one of the options that 0.20 takes.
    const options = { top: Math.max(0, sheet.y - 8), left: sheet.doc.page.width, expanded: false };
    return parent.addItem(title, options);
  }
}

const gap = 30;
