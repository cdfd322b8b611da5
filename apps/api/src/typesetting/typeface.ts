import { drawnSign, type DrawnSign } from './drawn-signs.js';
import { scripts, type Face, type FontFile, type Script } from './typeface-files.js';

/** Letters that one font file has, or one sign to be drawn. */
export type Run =
  | { readonly text: string; readonly font: string; readonly sign?: undefined }
  | { readonly text: string; readonly sign: DrawnSign; readonly font?: undefined };

const nameOf = (face: Face, script: Script): string => `${face} ${script}`;

/** What a space or a stand-in is set in where nothing else says so. */
export const plainFont = nameOf('regular', 'latin');

/** Signs that stand for nothing to be seen. */
const unseen = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Variation_Selector}]/gu;

/** The typeface within one document: which font has a letter, how wide a text is, how it is put down. */
export class Typeface {
  private readonly fontOfSign = new Map<string, string | null>();

  constructor(
    private readonly doc: PDFKit.PDFDocument,
    files: readonly FontFile[],
  ) {
    for (const { face, script, bytes } of files) doc.registerFont(nameOf(face, script), bytes);
  }

  runsOf(text: string, face: Face): Run[] {
    const runs: Run[] = [];
    for (const sign of text.normalize('NFC').replace(unseen, '')) {
      const last = runs.at(-1);
      // A space belongs to whatever it follows.
      const font = sign === ' ' && last?.font ? last.font : this.fontFor(sign, face);
      if (font === null) runs.push({ text: sign, sign: drawnSign(sign) });
      else if (last?.font === font) runs[runs.length - 1] = { text: last.text + sign, font };
      else runs.push({ text: sign, font });
    }
    return runs;
  }

  /** @returns points */
  widthOf(run: Run, size: number, spacing = 0): number {
    if (run.sign) return run.sign.widthEm * size;
    this.doc.font(run.font).fontSize(size);
    // Spacing follows each letter, the last one too, so that runs can be put end to end.
    return this.doc.widthOfString(run.text) + spacing * run.text.length;
  }

  /** Puts a run down with its left end and baseline where told. */
  put(
    run: Run,
    x: number,
    baselineY: number,
    style: { size: number; colour: string; spacing?: number },
  ): void {
    const { doc } = this;
    const { size, colour, spacing = 0 } = style;
    if (!run.sign) {
      doc.font(run.font).fontSize(size).fillColor(colour);
      doc.text(run.text, x, baselineY, {
        lineBreak: false,
        baseline: 'alphabetic',
        characterSpacing: spacing,
      });
      return;
    }
    doc.save();
    run.sign.draw(doc, x, baselineY, size, colour);
    this.setUnseen(run.sign, run.text, { x, baselineY, size });
    doc.restore();
  }

  private fontFor(sign: string, face: Face): string | null {
    const key = `${face} ${sign}`;
    const known = this.fontOfSign.get(key);
    if (known !== undefined) return known;
    const codePoint = sign.codePointAt(0) ?? 0;
    const script = scripts.find((one) => this.hasGlyph(nameOf(face, one), codePoint));
    const font = script ? nameOf(face, script) : null;
    this.fontOfSign.set(key, font);
    return font;
  }

  /**
   * Sets a letter that is not painted and says which sign it stands for. pdfkit's own `text` would leave the
   * coordinates of the letter before the mark ends, and readers then look for the sign elsewhere on the page.
   */
  private setUnseen(
    { standIn, widthEm }: DrawnSign,
    sign: string,
    { x, baselineY, size }: { x: number; baselineY: number; size: number },
  ): void {
    const { doc } = this;
    const font = this.opened(plainFont);
    const stretch = (100 * widthEm * size) / doc.fontSize(size).widthOfString(standIn);
    doc.page.fonts[font.id] ??= font.ref();
    doc.transform(1, 0, 0, -1, 0, doc.page.height);
    doc.markContent('Span', { actual: sign });
    doc.addContent(
      `BT 1 0 0 1 ${x.toFixed(3)} ${(doc.page.height - baselineY).toFixed(3)} Tm 3 Tr ` +
        `/${font.id} ${size.toFixed(3)} Tf ${stretch.toFixed(2)} Tz <${font.encode(standIn)[0].join('')}> Tj ET`,
    );
    doc.endMarkedContent();
  }

  private hasGlyph(font: string, codePoint: number): boolean {
    return this.opened(font).font.hasGlyphForCodePoint(codePoint);
  }

  /** pdfkit keeps the font it opened, which alone knows its letters, and has no other door to it. */
  private opened(font: string): OpenedFont {
    return (this.doc.font(font) as unknown as { _font: OpenedFont })._font;
  }
}

interface OpenedFont {
  readonly id: string;
  readonly font: { hasGlyphForCodePoint(codePoint: number): boolean };
  ref(): unknown;
  encode(text: string): [glyphs: string[], positions: unknown];
}
