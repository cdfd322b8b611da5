import type { LetterField } from '@windchest/contracts';
import { fillFields, loneField } from './letter-fields.js';
import type { ToPrint } from './reprint-book.js';

const MARKDOWN_SIGNS = /[\\`*_{}[\]<>()#+\-.!|~]/g;
const escaped = (text: string): string => text.replace(MARKDOWN_SIGNS, '\\$&');

/** A letter's Markdown with its fields filled in: still Markdown, for the pages that show letters. */
export const filledMarkdown = (
  body: string,
  values: Record<Exclude<LetterField, 'reprint_list'>, string>,
  toPrint: readonly ToPrint[] | null,
): string =>
  body
    .split(/\n{2,}/)
    .flatMap((block) => {
      const alone = loneField(block);
      if (alone === 'reprint_list') return toPrint ? [listOf(toPrint)] : [];
      if (alone === 'download_link')
        return values.download_link ? [`[Get the files](${values.download_link})`] : [];
      return [
        fillFields(block, (field) =>
          field === 'reprint_list'
            ? escaped((toPrint ?? []).map(({ code }) => code).join(', ') || 'nothing')
            : field === 'download_link'
              ? values.download_link
              : escaped(values[field]),
        ),
      ];
    })
    .join('\n\n');

const listOf = (toPrint: readonly ToPrint[]): string =>
  toPrint.length === 0
    ? 'For your build there is nothing to reprint.'
    : toPrint
        .map(
          ({ code, name, quantity, why, isOnlyIfItTroubles }) =>
            `- **${escaped(code)}** ${escaped(name)} × ${quantity}: ${isOnlyIfItTroubles ? 'only if the old one troubles you. ' : ''}${escaped(why)}`,
        )
        .join('\n');
