import type { EmailBlock, EmailContent, PartRow, PriceRow, PriceSum } from './email-content.js';
import type { EmailWorkshop } from './email-message.js';
import { texts } from './texts.js';
import { wrapText } from './wrap-text.js';

const item = (text: string): string => wrapText(text, { indent: '- ', hang: '  ' });
const indented = (text: string): string => wrapText(text, { indent: '  ' });

const priceRow = ({ title, detail, amount }: PriceRow): string =>
  `${wrapText(`${title}: ${amount}`)}\n${indented(detail)}`;

// Said in words and not set in columns: text is read in proportional type, and aloud.
const priceTable = (rows: readonly PriceRow[], sums: readonly PriceSum[]): string =>
  [...rows.map(priceRow), sums.map(({ label, amount }) => wrapText(`${label}: ${amount}`)).join('\n')].join(
    '\n\n',
  );

const partRow = ({ code, name, times, why }: PartRow): string =>
  `${item(`${code} ${name} ${times}`)}\n${indented(why)}`;

function blockText(block: EmailBlock): string | undefined {
  switch (block.kind) {
    case 'paragraph':
      return wrapText(block.text);
    case 'button':
      return `${wrapText(`${block.label}:`)}\n${block.link}`;
    case 'pasted-link':
      // The text shows the address under its verb already.
      return undefined;
    case 'price-table':
      return priceTable(block.rows, block.sums);
    case 'parts-table':
      return block.rows.map(partRow).join('\n');
    case 'quote':
      return [wrapText(block.text, { indent: '> ' }), wrapText(block.by, { indent: '> ' })].join('\n');
    case 'note':
      return `${wrapText(`${block.label}:`)}\n${wrapText(block.text)}`;
    case 'title-block':
      return block.cells
        .map(({ label, value, link }) => wrapText(`${label}: ${value}`) + (link ? `\n${link}` : ''))
        .join('\n');
    case 'prepared':
      return block.text;
  }
}

/** The text alternative: the same blocks in the same order, a link on a line of its own, whole. */
export function renderText(content: EmailContent, workshop: EmailWorkshop): string {
  const heading = wrapText(content.heading);
  const underline = '='.repeat(Math.max(...heading.split('\n').map((line) => line.length)));
  const body = content.blocks.map(blockText).filter((text) => text !== undefined && text !== '');
  const footer = [
    wrapText(content.reason),
    ...(content.stop ? [`${wrapText(`${content.stop.label}:`)}\n${content.stop.link}`] : []),
    ...(workshop.replyTo ? [wrapText(texts.replies(workshop.replyTo))] : []),
    wrapText([workshop.name, workshop.address].filter(Boolean).join(', ')),
    workshop.baseUrl,
  ];
  // "-- " with its space marks the signature (RFC 3676 §4.3), so that replies leave it out.
  return `${heading}\n${underline}\n\n${body.join('\n\n')}\n\n-- \n${footer.join('\n')}\n`;
}
