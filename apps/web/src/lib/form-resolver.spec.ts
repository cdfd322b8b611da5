import { z } from 'zod';
import { formResolver, sentenceOf } from './form-resolver.js';

const schema = z.object({
  name: z.string().trim().min(1).max(5),
  lengthMm: z.number().positive().max(100),
  count: z.int().min(1),
  code: z.string().regex(/^[A-Z]$/, 'Write one capital.'),
});
const options = { fields: {}, shouldUseNativeValidation: false };

async function faultsOf(values: unknown): Promise<Record<string, string | undefined>> {
  const { errors } = await formResolver(schema)(values as never, undefined, options as never);
  return Object.fromEntries(
    Object.entries(errors).map(([name, fault]) => [name, (fault as { message?: string }).message]),
  );
}

describe('formResolver', () => {
  it('says what to write instead of what the schema library says', async () => {
    expect(await faultsOf({ name: ' ', lengthMm: NaN, count: 1.5, code: 'A' })).toEqual({
      name: 'Fill this in.',
      lengthMm: 'Write a number.',
      count: 'Write a whole number.',
    });
    expect(await faultsOf({ name: 'abcdef', lengthMm: 0, count: 0, code: 'A' })).toEqual({
      name: 'Use 5 characters at most.',
      lengthMm: 'Write more than 0.',
      count: 'Write 1 or more.',
    });
    expect(await faultsOf({ name: 'a', lengthMm: 101, count: 1, code: 'A' })).toEqual({
      lengthMm: 'Write 100 or less.',
    });
  });

  it('keeps the sentences a schema brings itself', async () => {
    expect(await faultsOf({ name: 'a', lengthMm: 1, count: 1, code: 'a' })).toEqual({
      code: 'Write one capital.',
    });
  });

  it('checks what the form turns into, not what stands in it', async () => {
    const resolve = formResolver(schema, (values: { text: string }) => ({
      name: values.text,
      lengthMm: 2,
      count: 3,
      code: 'B',
    }));
    const { values } = await resolve({ text: ' ab ' }, undefined, options as never);
    expect(values).toEqual({ name: 'ab', lengthMm: 2, count: 3, code: 'B' });
  });

  it('has a sentence for every other issue', () => {
    expect(sentenceOf({ code: 'custom' })).toBe('This has not the right form. Check it and try again.');
  });
});
