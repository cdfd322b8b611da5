import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { may } from '@windchest/contracts';
import type { Request } from 'express';
import { endpointOf } from './endpoint.js';
import { personOf } from './person.js';
import { Refusal } from './refusal.js';

/** Deny by default: a route that is not in the contract is nobody's. */
@Injectable()
export class AccessGuard implements CanActivate {
  canActivate(context: ExecutionContext): boolean {
    const endpoint = endpointOf(context);
    if (!endpoint) throw new Refusal('forbidden', 'This route declares no access, so nobody may call it.');
    if (endpoint.access === 'public') return true;
    const person = personOf(context.switchToHttp().getRequest<Request>());
    if (!person) throw new Refusal('not-signed-in', 'Sign in first.');
    if (endpoint.access === 'signed-in') return true;
    if (!may(person.role, endpoint.access))
      throw new Refusal('forbidden', 'Your role does not include this.');
    return true;
  }
}
