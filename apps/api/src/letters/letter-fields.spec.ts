import { checkFields, fieldsIn, fillFields, loneField } from './letter-fields.js';

const values = {
  name: '',
  kit: 'Curlew',
  held: 'Mk 1.0',
  newest: 'Mk 1.1',
  reprint_list: '',
  download_link: 'x',
};
const fill = (text: string): string => fillFields(text, (field) => values[field]);

describe('fields of a letter', () => {
  it('are filled in, and an empty one takes the space before it along', () => {
    expect(fill('Hello {name}, {kit} {newest} is out.')).toBe('Hello, Curlew Mk 1.1 is out.');
  });

  it('that are none stay as they are', () => expect(fill('{nmae} {Kit}')).toBe('{nmae} {Kit}'));

  it('are known where they stand alone', () => {
    expect([loneField(' {reprint_list}\n'), loneField('x {reprint_list}')]).toEqual(['reprint_list', null]);
  });

  it('are counted', () => expect([...fieldsIn('{name} {kit} {name}')]).toEqual(['name', 'kit']));

  it.each([
    ['an unknown one', { subject: 'x', body: '{nmae}', kitId: 'k' }, 'There is no field {nmae}.'],
    ['a list in the subject', { subject: '{reprint_list}', body: '', kitId: 'k' }, 'The subject can hold'],
    ['one of a kit without a kit', { subject: 'x', body: '{held}', kitId: null }, 'choose the kit'],
  ])('refuse %s', (_, words, sentence) => expect(() => checkFields(words)).toThrow(sentence));
});
