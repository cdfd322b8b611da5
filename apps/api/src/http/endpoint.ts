import {
  applyDecorators,
  createParamDecorator,
  HttpCode,
  RequestMapping,
  RequestMethod,
  SetMetadata,
  type ExecutionContext,
} from '@nestjs/common';
import { endpoints, type EndpointDefinition, type EndpointKey } from '@windchest/contracts';
import type { Request } from 'express';
import { parseInput } from './parse-input.js';

export const ENDPOINT = Symbol('endpoint');
export interface EndpointMetadata extends EndpointDefinition {
  readonly key: EndpointKey;
}

/**
 * Binds a handler to a route of the contract: its method, path, status, and who may call it. The
 * guard, the validation, the answer's shape and the API description all read the same entry.
 */
export const Endpoint = (key: EndpointKey): MethodDecorator => {
  const [method, path] = key.split(' ') as [keyof typeof RequestMethod, string];
  const definition: EndpointDefinition = endpoints[key];
  return applyDecorators(
    RequestMapping({ path, method: RequestMethod[method] }),
    HttpCode(definition.status ?? (definition.response === null ? 204 : 200)),
    SetMetadata(ENDPOINT, { ...definition, key } satisfies EndpointMetadata),
  );
};

export const endpointOf = (context: ExecutionContext): EndpointMetadata | undefined =>
  Reflect.getMetadata(ENDPOINT, context.getHandler()) as EndpointMetadata | undefined;

/** `{params, query, body}` validated by the contract; use with the type `Handled<'GET /kits'>`. */
export const Input = createParamDecorator((_: unknown, context: ExecutionContext) => {
  const endpoint = endpointOf(context);
  if (!endpoint)
    throw new Error(
      `${context.getClass().name}.${context.getHandler().name} takes input without an endpoint.`,
    );
  return parseInput(endpoint, context.switchToHttp().getRequest<Request>());
});
