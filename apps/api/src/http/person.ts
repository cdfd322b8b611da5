import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Role } from '@windchest/contracts';
import type { Request } from 'express';
import { Refusal } from './refusal.js';

/** Who is signed in, as every room sees it. */
export interface SignedIn {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly role: Role;
  readonly isVerified: boolean;
}

export const personOf = (request: Request): SignedIn | null => (request as { user?: SignedIn }).user ?? null;

/** The person signed in, or null for a visitor. */
export const MaybePerson = createParamDecorator((_: unknown, context: ExecutionContext): SignedIn | null =>
  personOf(context.switchToHttp().getRequest<Request>()),
);

/** The person signed in; for routes whose access asks for one. */
export const ThisPerson = createParamDecorator((_: unknown, context: ExecutionContext): SignedIn => {
  const person = personOf(context.switchToHttp().getRequest<Request>());
  if (!person) throw new Refusal('not-signed-in', 'Sign in first.');
  return person;
});
