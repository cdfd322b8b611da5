import type { EmailBlock, PartRow, PriceRow, PriceSum, TitleCell } from './email-content.js';
import { escapeHtml, escapeLink } from './escape-html.js';
import { styles } from './mail-styles.js';
import { texts } from './texts.js';

const table = (rows: string, attributes = ''): string =>
  `<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0"${attributes}>${rows}</table>`;

const spaced = (html: string): string => table(`<tr><td style="padding:0 0 20px">${html}</td></tr>`);

function buttonHtml(label: string, link: string, isSecondary: boolean): string {
  const [cellClass, cellStyle, linkClass, linkStyle] = isSecondary
    ? ['', 'border-radius:2px', 'w-ink w-rule', styles.secondaryButton]
    : ['w-button-cell', styles.buttonCell, 'w-button', styles.button];
  return `<table role="presentation" cellpadding="0" cellspacing="0" border="0" style="margin:4px 0 16px"><tr><td class="${cellClass}" style="${cellStyle}"><a class="${linkClass}" href="${escapeLink(link)}" style="${linkStyle}">${escapeHtml(label)}</a></td></tr></table>`;
}

const priceRowHtml = ({ title, detail, amount }: PriceRow): string =>
  `<tr><td class="w-ink w-hairline" style="${styles.cell}"><strong>${escapeHtml(title)}</strong><br><span class="w-soft" style="${styles.detail}">${escapeHtml(detail)}</span></td><td class="w-ink w-hairline" style="${styles.cell};${styles.figure}">${escapeHtml(amount)}</td></tr>`;

function priceSumHtml({ label, amount, isTotal, isSoft }: PriceSum): string {
  const style = isTotal ? styles.totalCell : isSoft ? styles.softSumCell : styles.sumCell;
  const colour = isSoft ? 'w-soft' : 'w-ink';
  return `<tr><td class="${colour}" style="${style}">${escapeHtml(label)}</td><td class="${colour}" style="${style};${styles.figure}">${escapeHtml(amount)}</td></tr>`;
}

// A real table of facts, not of layout: no presentation role, and headed columns for screen readers.
function partsTableHtml(rows: readonly PartRow[], colourHex: string | undefined): string {
  const { part, print, why } = texts.revisionReleased.columns;
  const colour = colourHex && /^#[0-9a-f]{6}$/i.test(colourHex) ? colourHex : undefined;
  // Printed things are filled in the kit's colour and carry layer lines; without a colour there is no mark.
  const mark = colour ? `<span style="${styles.printedMark};background-color:${colour}"></span>` : '';
  const head = (label: string, more = ''): string =>
    `<th scope="col" align="left" class="w-soft w-rule" style="${styles.columnHead}${more}">${label}</th>`;
  const body = rows.map(
    (row) =>
      `<tr><td class="w-ink w-hairline" style="${styles.cell};padding-right:16px">${mark}<strong>${escapeHtml(row.code)}</strong><br>${escapeHtml(row.name)}</td><td class="w-ink w-hairline" style="${styles.cell};white-space:nowrap;padding-right:16px">${escapeHtml(row.times)}</td><td class="w-ink w-hairline" style="${styles.cell}">${escapeHtml(row.why)}</td></tr>`,
  );
  return `<table width="100%" cellpadding="0" cellspacing="0" border="0" style="margin:0 0 20px"><tr>${head(part)}${head(print)}${head(why)}</tr>${body.join('')}</table>`;
}

function titleBlockHtml(cells: readonly TitleCell[]): string {
  const cellHtml = ({ label, value, link }: TitleCell, rules: string, columns: number): string => {
    const shown = link
      ? `<a class="w-ink" href="${escapeLink(link)}" style="${styles.link}">${escapeHtml(value)}</a>`
      : escapeHtml(value);
    return `<td class="w-rule" colspan="${columns}" style="${styles.titleCell};${rules}"><span class="w-soft" style="${styles.titleLabel}">${escapeHtml(label)}</span><br><span class="w-ink" style="${styles.titleValue}">${shown}</span></td>`;
  };
  const rows: string[] = [];
  for (let at = 0; at < cells.length; at += 2) {
    const [left, right] = [cells[at], cells[at + 1]];
    if (!left) break;
    const above = at > 0 ? styles.ruleAbove : '';
    const rightHtml = right ? cellHtml(right, `${styles.ruleBefore};${above}`, 1) : '';
    rows.push(`<tr>${cellHtml(left, above, right ? 1 : 2)}${rightHtml}</tr>`);
  }
  return table(rows.join(''), ` class="w-rule" style="${styles.titleBlock}"`);
}

/** One block as HTML. Every string is escaped here, save what was prepared elsewhere. */
export function blockHtml(block: EmailBlock): string {
  switch (block.kind) {
    case 'paragraph':
      return `<p class="${block.isSoft ? 'w-soft' : 'w-ink'}" style="${block.isSoft ? styles.softParagraph : styles.paragraph}">${escapeHtml(block.text)}</p>`;
    case 'button':
      return buttonHtml(block.label, block.link, block.isSecondary ?? false);
    case 'pasted-link': {
      const link = escapeLink(block.link);
      return `<p class="w-soft" style="${styles.softParagraph}">${escapeHtml(block.intro)}<br><a class="w-soft" href="${link}" style="${styles.pastedLink}">${link}</a></p>`;
    }
    case 'price-table':
      return spaced(table(block.rows.map(priceRowHtml).join('') + block.sums.map(priceSumHtml).join('')));
    case 'parts-table':
      return partsTableHtml(block.rows, block.colourHex);
    case 'quote':
      return `<blockquote class="w-rule" style="${styles.quote}"><p class="w-ink" style="${styles.paragraph};margin:0">${escapeHtml(block.text)}</p><p class="w-soft" style="${styles.softParagraph};margin:0">${escapeHtml(block.by)}</p></blockquote>`;
    case 'note':
      return `<p class="w-ink w-hairline" style="${styles.noteHead}">${escapeHtml(block.label)}</p><p class="w-soft" style="${styles.softParagraph}">${escapeHtml(block.text)}</p>`;
    case 'title-block':
      return titleBlockHtml(block.cells);
    case 'prepared':
      return block.html;
  }
}
