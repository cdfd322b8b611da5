import type { EndpointDefinition } from '@windchest/contracts';
import type { Request } from 'express';
import { Refusal } from './refusal.js';

const PARTS = ['params', 'query', 'body'] as const;

/** @throws Refusal `validation-failed` with a sentence for each field */
export const parseInput = (
  endpoint: EndpointDefinition,
  request: Pick<Request, 'params' | 'query' | 'body'>,
): Record<string, unknown> => {
  const input: Record<string, unknown> = {};
  const fields: Record<string, string> = {};
  for (const part of PARTS) {
    const schema = endpoint[part];
    if (!schema) continue;
    const parsed = schema.safeParse(request[part] ?? {});
    if (parsed.success) input[part] = parsed.data;
    else for (const issue of parsed.error.issues) fields[issue.path.join('.') || part] ??= issue.message;
  }
  const faults = Object.entries(fields);
  if (faults.length === 0) return input;
  if (endpoint.params && 'params' in input === false)
    throw new Refusal('not-found', 'There is nothing at this address.');
  const [[name, sentence]] = faults as [[string, string]];
  throw new Refusal('validation-failed', `${name}: ${sentence}`, { fields });
};
