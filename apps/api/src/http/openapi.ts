import type { OpenAPIObject } from '@nestjs/swagger';
import { endpoints, problemSchema, type EndpointDefinition } from '@windchest/contracts';
import { z } from 'zod';

type JsonSchema = Record<string, unknown>;
const toJson = (schema: z.ZodType, io: 'input' | 'output'): JsonSchema => {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  }) as JsonSchema;
  return rest;
};

const parametersOf = (where: 'path' | 'query', schema: z.ZodType | undefined): JsonSchema[] => {
  if (!schema) return [];
  const { properties = {}, required = [] } = toJson(schema, 'input') as {
    properties?: Record<string, JsonSchema>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, one]) => ({
    name,
    in: where,
    required: where === 'path' || required.includes(name),
    schema: one,
  }));
};

const operationOf = (key: string, endpoint: EndpointDefinition): JsonSchema => {
  const ok = String(endpoint.status ?? (endpoint.response === null ? 204 : 200));
  return {
    operationId: key.replace(/[^A-Za-z0-9]+/g, '_'),
    summary: endpoint.summary,
    tags: [key.split('/')[1] === 'workshop' ? `workshop ${key.split('/')[2]}` : key.split('/')[1]],
    'x-access': endpoint.access,
    ...(endpoint.access === 'public' ? {} : { security: [{ session: [] }] }),
    parameters: [...parametersOf('path', endpoint.params), ...parametersOf('query', endpoint.query)],
    ...(endpoint.body
      ? {
          requestBody: {
            required: true,
            content: { 'application/json': { schema: toJson(endpoint.body, 'input') } },
          },
        }
      : {}),
    responses: {
      [ok]: {
        description: endpoint.summary,
        ...(endpoint.response instanceof z.ZodType
          ? { content: { 'application/json': { schema: toJson(endpoint.response, 'output') } } }
          : {}),
      },
      default: {
        description: 'A problem',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
};

/** The API's description (OpenAPI 3.1), made from the same contract that validates and guards it. */
export const describeApi = (workshop: string): OpenAPIObject => {
  const paths: Record<string, Record<string, JsonSchema>> = {};
  for (const [key, endpoint] of Object.entries(endpoints)) {
    const [method, path] = key.split(' ') as [string, string];
    const address = `/api${path.replace(/:(\w+)/g, '{$1}')}`;
    (paths[address] ??= {})[method.toLowerCase()] = operationOf(key, endpoint);
  }
  return {
    openapi: '3.1.0',
    info: {
      title: `${workshop}: the shop's API`,
      version: '1',
      description: 'Unsafe methods need the header `X-Windchest: 1` beside the session cookie.',
    },
    paths,
    components: {
      schemas: { Problem: toJson(problemSchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'windchest' } },
    },
  } as unknown as OpenAPIObject;
};
