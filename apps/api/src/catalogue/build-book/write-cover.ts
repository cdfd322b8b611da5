import type { BuildBook } from './build-book.js';
import { drawUprightDimension } from './dimension-line.js';
import { drawPart } from './draw-part.js';
import { drawVoice } from './draw-voice.js';
import { largestScale, scaleText } from './drawing-scale.js';
import { fixedText } from '../../typesetting/number-text.js';
import { contentWidth, inks, mm, page } from '../../typesetting/page-geometry.js';
import { layOutRank } from './rank-layout.js';
import type { BookSheet } from './book-sheet.js';
import { styles } from '../../typesetting/text-styles.js';
import { bookStyles } from './book-styles.js';
import { bookBlockTop } from './write-title-block.js';

const workshopTop = mm(20);
const nameTop = mm(31);
const emblemGap = mm(13);
/** The contents stand between the emblem and the title block: a line each, and a heading. */
const contentsHeight = mm(48);

export const contentsTop = bookBlockTop - contentsHeight;

/** The first page but for its contents and title block; returns the scale of its drawing, if it has one. */
export const writeCover = (sheet: BookSheet, book: BuildBook): string | null => {
  const place = { x: page.left, width: contentWidth };
  sheet.block('P', () => sheet.putOneLine(book.workshop.name, styles.fact, place, workshopTop));
  sheet.y = nameTop;
  sheet.block('H1', () => {
    // A long name is set smaller before it is broken.
    const size = Math.min(1, Math.max(0.5, contentWidth / widthAtFullSize(sheet, book.kit.name)));
    const style = {
      ...bookStyles.kitName,
      size: bookStyles.kitName.size * size,
      leading: Math.max(22, bookStyles.kitName.leading * size),
      spacing: bookStyles.kitName.spacing === undefined ? 0 : bookStyles.kitName.spacing * size,
    };
    sheet.y += sheet.put(
      book.kit.name,
      style,
      { ...place, x: page.left - 2.5 * size, width: contentWidth + 8 },
      sheet.y,
    );
  });
  sheet.y += 6;
  if (book.kit.tagline !== '')
    sheet.block('P', () => {
      sheet.y += sheet.put(book.kit.tagline, bookStyles.tagline, place, sheet.y);
    });
  sheet.y += emblemGap;
  return book.voices.length > 0 ? drawRank(sheet, book) : drawLargestPart(sheet, book);
};

const widthAtFullSize = (sheet: BookSheet, name: string): number =>
  sheet.lines(name.replaceAll(' ', '\u00a0'), bookStyles.kitName, Number.POSITIVE_INFINITY)[0]?.width ?? 1;

const drawRank = (sheet: BookSheet, { voices, kit }: BuildBook): string => {
  const rank = layOutRank(voices);
  const roomHeight = contentsTop - mm(16) - sheet.y;
  const ratio = largestScale(
    (one) => mm(rank.widthMm * one) <= contentWidth && mm(rank.heightMm * one) <= roomHeight,
    2,
  );
  const baseline = sheet.y + mm(rank.heightMm * ratio);
  const longest = rank.voices.reduce((most, one) => (one.heightMm > most.heightMm ? one : most));
  sheet.block(
    'Figure',
    () => {
      for (const { voice, xMm, widthMm, heightMm } of rank.voices) {
        const height = mm(heightMm * ratio);
        drawVoice(
          sheet.doc,
          voice.kind,
          {
            x: page.left + mm(xMm * ratio),
            y: baseline - height,
            width: Math.max(0.6, mm(widthMm * ratio)),
            height,
          },
          sheet.shades,
        );
      }
      sheet.rule(page.left, baseline, mm(rank.widthMm * ratio), inks.ink, 0.7);
      labelVoices(sheet, rank.voices, ratio, baseline + 3);
      drawUprightDimension(sheet, {
        x: page.left - mm(6),
        top: baseline - mm(longest.heightMm * ratio),
        bottom: baseline,
        text: fixedText(longest.heightMm, 1),
      });
    },
    `The ${voices.length} voices of ${kit.name} side by side, drawn to scale; the longest is ${fixedText(longest.heightMm, 1)} mm.`,
  );
  sheet.y = baseline + mm(10);
  return scaleText(ratio);
};

/** The letters of the notes under the voices; every second or third where they stand too close. */
const labelVoices = (
  sheet: BookSheet,
  voices: ReturnType<typeof layOutRank>['voices'],
  ratio: number,
  top: number,
): void => {
  const narrowest = Math.min(...voices.map(({ slotMm }) => mm(slotMm * ratio)));
  const every = Math.max(1, Math.ceil(14 / narrowest));
  voices.forEach(({ voice, xMm, widthMm }, at) => {
    if (at % every !== 0) return;
    const middle = page.left + mm((xMm + widthMm / 2) * ratio);
    const letter = voice.note
      .replace(/-?\d+$/, '')
      .replace('#', '♯')
      .replace(/b$/, '♭');
    sheet.put(letter, bookStyles.partCode, { x: middle - 12, width: 24, align: 'centre' }, top);
  });
};

/** A kit without voices shows its largest part instead. */
const drawLargestPart = (sheet: BookSheet, { parts }: BuildBook): string | null => {
  const drawn = parts.flatMap((part) => (part.drawing ? [{ ...part, drawing: part.drawing }] : []));
  if (drawn.length === 0) return null;
  const largest = drawn.reduce((most, one) =>
    one.drawing.widthMm * one.drawing.heightMm > most.drawing.widthMm * most.drawing.heightMm ? one : most,
  );
  const { drawing } = largest;
  const roomHeight = contentsTop - mm(16) - sheet.y;
  const ratio = largestScale(
    (one) => mm(drawing.widthMm * one) <= contentWidth && mm(drawing.heightMm * one) <= roomHeight,
  );
  sheet.block(
    'Figure',
    () => drawPart(sheet.doc, drawing, { x: page.left, y: sheet.y, ratio }, sheet.shades),
    `${largest.code} ${largest.name}, drawn to scale`,
  );
  const bottom = sheet.y + mm(drawing.heightMm * ratio);
  sheet.decoration(() =>
    drawUprightDimension(sheet, {
      x: page.left - mm(6),
      top: sheet.y,
      bottom,
      text: fixedText(drawing.heightMm, 1),
    }),
  );
  sheet.y = bottom;
  return scaleText(ratio);
};
