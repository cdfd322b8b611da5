import { assemblySteps, type AssemblyStep } from './assembly-steps.js';
import type { BookPart } from './build-book.js';
import { codesIn, plainText, type NoteBlock } from './note-blocks.js';
import { mm, page, sideLeft, sideWidth, textWidth } from '../../typesetting/page-geometry.js';
import { drawnParts } from './write-parts-sheet.js';
import type { Sections } from './sections.js';
import type { BookSheet } from './book-sheet.js';
import { layOutSideParts, sideHeight, drawSideParts } from './side-parts.js';
import { styles } from '../../typesetting/text-styles.js';
import { bookStyles } from './book-styles.js';
import { withPlaces, writeNotes, type NotesContext } from './write-notes.js';

const stepGap = 20;
const place = { x: page.left, width: textWidth };

/** The notes in steps: the number hangs in the left edge, the parts of a step are drawn at its right. */
export const writeAssembly = (
  sheet: BookSheet,
  sections: Sections,
  notes: readonly NoteBlock[],
  parts: readonly BookPart[],
  context: NotesContext,
): void => {
  const drawn = drawnParts(parts);
  assemblySteps(notes).forEach((one, at) => {
    if (at > 0) sheet.y += stepGap;
    if (one.kind === 'between') {
      writeNotes(sheet, one.blocks, place, context);
      return;
    }
    const codes = new Set(codesIn([{ kind: 'paragraph', spans: one.title }, ...one.blocks]));
    // In the order of the parts sheet, so that like stands beside like.
    writeStep(sheet, sections, one, {
      ...context,
      headingTag: 'H3',
      side: drawn.filter(({ code }) => codes.has(code)),
    });
  });
};

const writeStep = (
  sheet: BookSheet,
  sections: Sections,
  step: AssemblyStep,
  context: NotesContext & { readonly side: ReturnType<typeof drawnParts> },
): void => {
  const rows = layOutSideParts(context.side, sideWidth);
  const drawingsHeight = sideHeight(rows);
  const isBeside = drawingsHeight <= mostSideHeight;
  sheet.ensure(
    Math.max(bookStyles.stepTitle.leading + 4 * styles.body.leading, isBeside ? drawingsHeight : 0),
  );
  const title = plainText(step.title);
  sections.addPlace([step.number, title].filter((words) => words !== '').join('  ') || 'Step');
  sheet.group('Sect', () => {
    const start = { page: sheet.pageCount, y: sheet.y };
    writeHeading(sheet, step, context);
    const textStart = sheet.y;
    if (isBeside) {
      // The first drawing's upper edge is level with the title.
      drawSideParts(sheet, rows, sideLeft, start.y + 4);
      sheet.y = textStart;
    }
    writeNotes(sheet, step.blocks, place, context);
    if (isBeside && sheet.pageCount === start.page) sheet.y = Math.max(sheet.y, start.y + drawingsHeight);
    if (!isBeside) {
      sheet.y += 10;
      const wide = layOutSideParts(context.side, page.right - page.left);
      for (const row of wide) {
        sheet.ensure(sideHeight([row]));
        sheet.y += drawSideParts(sheet, [row], page.left, sheet.y);
      }
    }
  });
};

/** A step of more drawings than that has them below it, across the page. */
const mostSideHeight = mm(120);

const writeHeading = (sheet: BookSheet, step: AssemblyStep, context: NotesContext): void => {
  const style = bookStyles.stepTitle;
  const hasTitle = plainText(step.title) !== '';
  const numberStyle = bookStyles.stepNumber;
  const drawNumber = () => {
    // On one baseline with the first line of what follows it.
    const first = hasTitle ? style : styles.body;
    const baseline = first.leading / 2 + first.size * 0.33;
    const top = sheet.y + baseline - (numberStyle.leading / 2 + numberStyle.size * 0.33);
    sheet.put(step.number, numberStyle, { x: page.edge, width: page.left - page.edge - 6 }, top);
  };
  if (!hasTitle) {
    if (step.number !== '') sheet.block('H2', drawNumber);
    return;
  }
  sheet.block('H2', () => {
    if (step.number !== '') drawNumber();
    sheet.write(sheet.lines(withPlaces(step.title, context), style, textWidth), style, place);
  });
  sheet.y += 4;
};
