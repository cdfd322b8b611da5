import { zodResolver } from '@hookform/resolvers/zod';
import type { FieldValues, Resolver } from 'react-hook-form';
import { config, type output, type ZodType } from 'zod';
import { schemaTexts } from '../config/texts/workshop-forms.js';

// The content security policy forbids code made from text, which zod would try for speed.
config({ jitless: true });

/** As much of an issue as its sentence needs. */
export interface SchemaIssue {
  code?: string;
  origin?: string;
  expected?: string;
  minimum?: unknown;
  maximum?: unknown;
  inclusive?: boolean;
}

const isNumeric = (origin: string | undefined) => origin === 'number' || origin === 'int';

/** Plain words where the schema brings none of its own. */
export function sentenceOf(issue: SchemaIssue): string {
  if (issue.code === 'invalid_type') {
    if (issue.expected === 'int') return schemaTexts.whole;
    return issue.expected === 'number' ? schemaTexts.number : schemaTexts.missing;
  }
  if (issue.code === 'too_small') {
    if (!isNumeric(issue.origin)) return schemaTexts.missing;
    const least = String(issue.minimum);
    return issue.inclusive ? schemaTexts.atLeast(least) : schemaTexts.moreThan(least);
  }
  if (issue.code === 'too_big') {
    const most = String(issue.maximum);
    return isNumeric(issue.origin) ? schemaTexts.atMost(most) : schemaTexts.tooLong(most);
  }
  return schemaTexts.wrongForm;
}

/**
 * Checks a form by a schema of the contract. `toBody` turns what stands in the fields into what is sent; where
 * it keeps the fields' names, faults find their fields by themselves.
 */
export function formResolver<F extends FieldValues, S extends ZodType>(
  schema: S,
  toBody: (values: F) => unknown = (values) => values,
): Resolver<F, unknown, output<S>> {
  const check = zodResolver(schema as never, { error: (issue) => sentenceOf(issue as SchemaIssue) });
  return ((values, context, options) =>
    check(toBody(values) as never, context, options as never)) as Resolver<F, unknown, output<S>>;
}
