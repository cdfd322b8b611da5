import { Injectable, type ExecutionContext } from '@nestjs/common';
import { AuthGuard } from '@nestjs/passport';
import type { Request } from 'express';
import { startSession } from './start-session.js';
import { wrongCredentials } from './local.strategy.js';
import type { SignedIn } from '../http/person.js';

/** Checks the passphrase and starts a session under a new id. */
@Injectable()
export class SignInGuard extends AuthGuard('local') {
  override async canActivate(context: ExecutionContext): Promise<boolean> {
    await super.canActivate(context);
    const request = context.switchToHttp().getRequest<Request>();
    await startSession(request, request.user as SignedIn);
    return true;
  }

  override handleRequest<T>(fault: unknown, person: T): T {
    if (fault) throw fault;
    if (!person) throw wrongCredentials();
    return person;
  }
}
