import { plainFont, type Run, type Typeface } from './typeface.js';
import type { Face } from './typeface-files.js';

/** A stretch of text of one look. A line break within it is kept. */
export interface Span {
  readonly text: string;
  readonly face?: Face;
  readonly colour?: string;
  /** Name of a place in the book. */
  readonly goTo?: string;
  readonly url?: string;
}

export interface TextStyle {
  readonly size: number;
  readonly leading: number;
  readonly face: Face;
  readonly colour: string;
  /** Points between letters; large type is set tighter. */
  readonly spacing?: number;
}

export interface PlacedRun {
  readonly run: Run;
  readonly span: Span;
  readonly x: number;
  readonly width: number;
}
export interface TextLine {
  readonly runs: readonly PlacedRun[];
  readonly width: number;
}

interface Piece {
  readonly run: Run;
  readonly span: Span;
}
interface Word {
  readonly pieces: readonly Piece[];
  readonly isAfterSpace: boolean;
  readonly isAfterBreak: boolean;
}

/** Breaks text into lines no wider than `width` points; a word that is wider than a line is broken itself. */
export const layOutText = (
  typeface: Typeface,
  spans: readonly Span[],
  style: TextStyle,
  width: number,
): TextLine[] => {
  const lines: TextLine[] = [];
  let line: Piece[] = [];
  const measure = (pieces: readonly Piece[]) => placed(typeface, pieces, style);
  const close = () => {
    lines.push(measure(line));
    line = [];
  };
  for (const word of wordsOf(typeface, spans, style)) {
    if (word.isAfterBreak && line.length > 0) close();
    const joined = joinedTo(line, word);
    if (measure(joined).width <= width) {
      line = joined;
      continue;
    }
    if (line.length > 0) close();
    for (const piece of brokenToFit(word.pieces, (pieces) => measure(pieces).width <= width)) {
      if (line.length > 0 && measure([...line, piece]).width > width) close();
      line = merged([...line, piece]);
    }
  }
  if (line.length > 0) close();
  return lines;
};

const wordsOf = function* (
  typeface: Typeface,
  spans: readonly Span[],
  style: TextStyle,
): Generator<Word, void, undefined> {
  let pieces: Piece[] = [];
  let isAfterSpace = false;
  let isAfterBreak = false;
  for (const span of spans) {
    for (const part of span.text.split(/(\n|[ \t]+)/)) {
      if (part === '') continue;
      if (!/^[\n \t]/.test(part)) {
        pieces.push(...typeface.runsOf(part, span.face ?? style.face).map((run) => ({ run, span })));
        continue;
      }
      if (pieces.length > 0) {
        yield { pieces, isAfterSpace, isAfterBreak };
        pieces = [];
        isAfterBreak = false;
      }
      isAfterSpace = true;
      if (part === '\n') isAfterBreak = true;
    }
  }
  if (pieces.length > 0) yield { pieces, isAfterSpace, isAfterBreak };
};

const joinedTo = (line: readonly Piece[], word: Word): Piece[] => {
  const last = line.at(-1);
  if (!last || !word.isAfterSpace) return merged([...line, ...word.pieces]);
  const space: Piece = last.run.font
    ? { ...last, run: { font: last.run.font, text: ' ' } }
    : { ...last, run: { font: plainFont, text: ' ' } };
  return merged([...line, space, ...word.pieces]);
};

/** Neighbours of one font and span become one run: fewer operators, and kerning across words. */
const merged = (pieces: readonly Piece[]): Piece[] => {
  const result: Piece[] = [];
  for (const piece of pieces) {
    const last = result.at(-1);
    if (last?.run.font && last.run.font === piece.run.font && last.span === piece.span)
      result[result.length - 1] = {
        ...last,
        run: { font: last.run.font, text: last.run.text + piece.run.text },
      };
    else result.push(piece);
  }
  return result;
};

const placed = (typeface: Typeface, pieces: readonly Piece[], style: TextStyle): TextLine => {
  let x = 0;
  const runs = pieces.map(({ run, span }) => {
    const width = typeface.widthOf(run, style.size, style.spacing);
    x += width;
    return { run, span, x: x - width, width };
  });
  return { runs, width: x };
};

const brokenToFit = function* (
  pieces: readonly Piece[],
  fits: (pieces: readonly Piece[]) => boolean,
): Generator<Piece, void, undefined> {
  if (fits(pieces)) {
    yield* pieces;
    return;
  }
  for (const piece of pieces) {
    if (!piece.run.font) yield piece;
    else for (const text of piece.run.text) yield { ...piece, run: { font: piece.run.font, text } };
  }
};
