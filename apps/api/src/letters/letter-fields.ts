import { letterFields, type LetterField } from '@windchest/contracts';
import { Refusal } from '../http/refusal.js';

const TOKEN = new RegExp(`(\\s?)\\{(${letterFields.join('|')})\\}`, 'g');
const ANY_BRACES = /\{([a-z][a-z_]*)\}/g;
const PART_CODE = /\[\[([^\]\s]{1,10})\]\]/g;

/** Puts values in place of `{fields}`; an empty value takes the space before it along: `Hello {name},`. */
export const fillFields = (text: string, valueOf: (field: LetterField) => string): string =>
  text.replace(TOKEN, (_, space: string, field: LetterField) => {
    const value = valueOf(field);
    return value === '' ? '' : `${space}${value}`;
  });

/** `[[H-03]]` as a reader without the page it leads to sees it. */
export const withPlainCodes = (text: string): string => text.replace(PART_CODE, '$1');

export const fieldsIn = (text: string): Set<LetterField> =>
  new Set([...text.matchAll(TOKEN)].map(([, , field]) => field as LetterField));

/** Null, or the one field that is all of a text. */
export const loneField = (text: string): LetterField | null => {
  const found = new RegExp(`^\\s*\\{(${letterFields.join('|')})\\}\\s*$`).exec(text)?.[1];
  return (found as LetterField | undefined) ?? null;
};

/** @throws Refusal where the letter asks for what nobody can fill in */
export const checkFields = (words: { subject: string; body: string; kitId: string | null }): void => {
  const known: readonly string[] = letterFields;
  for (const where of ['subject', 'body'] as const) {
    const unknown = [...words[where].matchAll(ANY_BRACES)].find(([, field]) => !known.includes(field ?? ''));
    if (unknown)
      throw wrong(
        where,
        `There is no field ${unknown[0]}. Known are ${known.map((one) => `{${one}}`).join(', ')}.`,
      );
  }
  const [inSubject, inBody] = [fieldsIn(words.subject), fieldsIn(words.body)];
  if (inSubject.has('reprint_list') || inSubject.has('download_link'))
    throw wrong('subject', 'The subject can hold {name}, {kit}, {held} and {newest} only.');
  const ofKit = (['kit', 'held', 'newest', 'reprint_list'] as const).find(
    (field) => inSubject.has(field) || inBody.has(field),
  );
  if (words.kitId === null && ofKit)
    throw wrong('kitId', `The letter has {${ofKit}} in it: choose the kit it is about.`);
};

const wrong = (field: string, sentence: string): Refusal =>
  new Refusal('validation-failed', sentence, { fields: { [field]: sentence } });
