import { inks, page } from './page-geometry.js';
import type { Sheet } from './sheet.js';
import type { Span, TextLine } from './text-lines.js';
import { styles } from './text-styles.js';

export interface Column {
  readonly title: string;
  readonly width: number;
  readonly align?: 'left' | 'right';
}
export interface Table {
  readonly x: number;
  readonly columns: readonly Column[];
  /** As many cells as columns. */
  readonly rows: readonly (readonly (readonly Span[] | string)[])[];
}

const gutter = 12;
const padding = 3.2;
const style = styles.table;

/** A ruled table; its head is written again on each page, a row is broken only if it is taller than a page. */
export const writeTable = (sheet: Sheet, table: Table): void => {
  const width = table.columns.reduce((sum, column) => sum + column.width, 0);
  sheet.group('Table', () => {
    sheet.ensure(headHeight + 2 * (style.leading + 2 * padding));
    writeHead(sheet, table, width, false);
    for (const row of table.rows) {
      const cells = table.columns.map((_, at) => sheet.lines(row[at] ?? '', style, cellWidth(table, at)));
      writeRow(sheet, table, width, cells);
    }
  });
};

/** The last column reaches to the table's edge. */
const cellWidth = ({ columns }: Table, at: number): number =>
  (columns[at]?.width ?? 0) - (at === columns.length - 1 ? 0 : gutter);

const headHeight = styles.label.leading + 2 * padding;

const writeHead = (sheet: Sheet, table: Table, width: number, isRepeated: boolean): void => {
  const write = (tell: (write: () => void) => void) =>
    inColumns(table, (column, place) => {
      if (column.title !== '')
        tell(() => sheet.put(column.title, styles.label, place, sheet.y + padding - 1));
    });
  if (isRepeated) write((draw) => sheet.decoration(draw));
  else sheet.group('TR', () => write((draw) => sheet.block('TH', draw)));
  sheet.y += headHeight;
  sheet.rule(table.x, sheet.y, width, inks.ink, 0.7);
};

const writeRow = (sheet: Sheet, table: Table, width: number, cells: readonly TextLine[][]): void => {
  const lineCount = Math.max(1, ...cells.map((lines) => lines.length));
  const fits = (count: number) => count * style.leading + 2 * padding <= sheet.roomLeft;
  const turnOver = () => {
    sheet.newPage();
    writeHead(sheet, table, width, true);
  };
  if (!fits(lineCount)) turnOver();
  const isLong = lineCount * style.leading + 2 * padding > page.bottom - page.top - headHeight;
  let from = 0;
  while (from < lineCount) {
    const until = isLong
      ? Math.min(lineCount, from + Math.max(1, Math.floor((sheet.roomLeft - 2 * padding) / style.leading)))
      : lineCount;
    sheet.group('TR', () =>
      inColumns(table, (_, place, at) => {
        sheet.block('TD', () => {
          (cells[at] ?? [])
            .slice(from, until)
            .forEach((line, index) =>
              sheet.putLine(line, style, place, sheet.y + padding + index * style.leading),
            );
        });
      }),
    );
    sheet.y += (until - from) * style.leading + 2 * padding;
    sheet.rule(table.x, sheet.y, width);
    from = until;
    if (from < lineCount) turnOver();
  }
};

const inColumns = (
  table: Table,
  visit: (column: Column, place: { x: number; width: number; align: 'left' | 'right' }, at: number) => void,
): void => {
  let left = table.x;
  table.columns.forEach((column, at) => {
    visit(column, { x: left, width: cellWidth(table, at), align: column.align ?? 'left' }, at);
    left += column.width;
  });
};
