import { inks, page } from './page-geometry.js';
import { layOutText, type Span, type TextLine, type TextStyle } from './text-lines.js';
import type { Typeface } from './typeface.js';

export interface TextPlace {
  readonly x: number;
  readonly width: number;
  readonly align?: 'left' | 'right' | 'centre';
}

/** Where a document is being written: the page, how far down it, and the tagged structure around it. */
export class Sheet {
  /** From the top of the page, in points. */
  y: number = page.top;
  private readonly parents: PDFKit.PDFStructureElement[];
  private isMarked = false;
  private pageNumber = 1;

  constructor(
    readonly doc: PDFKit.PDFDocument,
    readonly typeface: Typeface,
  ) {
    const root = doc.struct('Document');
    doc.addStructure(root);
    this.parents = [root];
  }

  get pageCount(): number {
    return this.pageNumber;
  }

  get roomLeft(): number {
    return page.bottom - this.y;
  }

  /** What is being said goes on there: an open paragraph stays one paragraph. */
  newPage(): void {
    this.doc.continueOnNewPage();
    this.pageNumber += 1;
    this.y = page.top;
  }

  /** Starts a new page unless so much room is left, or the page is untouched. */
  ensure(height: number): void {
    if (this.roomLeft < height && this.y > page.top) this.newPage();
  }

  /** A tagged element that holds others: a section, a table, a row. */
  group<T>(tag: string, write: () => T): T {
    const element = this.doc.struct(tag);
    this.parents.at(-1)?.add(element);
    this.parents.push(element);
    const result = write();
    this.parents.pop();
    element.end();
    return result;
  }

  /** Keeps a place in the structure for what is written at the end; returns how to write it. */
  reserve(tag: string): (write: () => void) => void {
    const element = this.doc.struct(tag);
    this.parents.at(-1)?.add(element);
    return (write) => {
      this.parents.push(element);
      write();
      this.parents.pop();
      element.end();
    };
  }

  /** A tagged element with content of its own: a heading, a paragraph, a cell, a figure with its description. */
  block(tag: string, write: () => void, alt?: string): void {
    const element = this.doc.struct(tag, alt === undefined ? {} : { alt });
    this.parents.at(-1)?.add(element);
    const content = this.doc.markStructureContent(tag);
    this.isMarked = true;
    write();
    this.isMarked = false;
    this.doc.endMarkedContent();
    element.add(content);
    element.end();
  }

  /** Lines and repeated words that are no content of their own. */
  decoration(draw: () => void): void {
    if (this.isMarked) {
      draw();
      return;
    }
    this.doc.markContent('Artifact', { type: 'Layout' });
    draw();
    this.doc.endMarkedContent();
  }

  lines(spans: readonly Span[] | string, style: TextStyle, width: number): TextLine[] {
    return layOutText(this.typeface, typeof spans === 'string' ? [{ text: spans }] : spans, style, width);
  }

  /** Puts one line down; `top` is the top of its leading. */
  putLine(line: TextLine, style: TextStyle, place: TextPlace, top: number): void {
    const slack = place.width - line.width;
    const left = place.x + (place.align === 'right' ? slack : place.align === 'centre' ? slack / 2 : 0);
    // The middle of the letters, which reach from the baseline up to two thirds of the size, is the leading's.
    const baselineY = top + style.leading / 2 + style.size * 0.33;
    for (const { run, span, x, width } of line.runs) {
      this.typeface.put(run, left + x, baselineY, {
        size: style.size,
        colour: span.colour ?? style.colour,
        spacing: style.spacing ?? 0,
      });
      const area = [left + x, baselineY - style.size * 0.8, width, style.size] as const;
      if (span.goTo !== undefined) this.doc.goTo(...area, span.goTo);
      else if (span.url !== undefined) this.doc.link(...area, span.url);
    }
  }

  /** Sets text at a place of its own, without moving down; returns its height. */
  put(spans: readonly Span[] | string, style: TextStyle, place: TextPlace, top: number): number {
    const lines = this.lines(spans, style, place.width);
    lines.forEach((line, at) => this.putLine(line, style, place, top + at * style.leading));
    return lines.length * style.leading;
  }

  /** Sets one line always: what is too long for its place is set smaller. */
  putOneLine(spans: readonly Span[] | string, style: TextStyle, place: TextPlace, top: number): void {
    const [line] = this.lines(spans, style, Number.POSITIVE_INFINITY);
    if (!line) return;
    const share = Math.min(1, place.width / line.width);
    const fitted = { ...style, size: style.size * share, spacing: (style.spacing ?? 0) * share };
    for (const one of this.lines(spans, fitted, Number.POSITIVE_INFINITY))
      this.putLine(one, fitted, place, top);
  }

  /** Writes down the page, never leaving one line alone at the foot or the head of a page. */
  write(lines: readonly TextLine[], style: TextStyle, place: TextPlace): void {
    let at = 0;
    while (at < lines.length) {
      const left = lines.length - at;
      let fitting = Math.floor((this.roomLeft + 0.01) / style.leading);
      if (fitting < left) {
        if (left - fitting === 1) fitting -= 1;
        if (fitting < 2 && this.y > page.top) {
          this.newPage();
          continue;
        }
      }
      for (const line of lines.slice(at, at + Math.max(1, fitting))) {
        this.putLine(line, style, place, this.y);
        this.y += style.leading;
        at += 1;
      }
    }
  }

  rule(x: number, y: number, width: number, colour: string = inks.hairline, weight = 0.5): void {
    this.decoration(() => {
      this.doc
        .moveTo(x, y)
        .lineTo(x + width, y)
        .lineWidth(weight)
        .strokeColor(colour)
        .stroke();
    });
  }
}
