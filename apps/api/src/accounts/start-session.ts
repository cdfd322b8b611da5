import type { Request } from 'express';
import type { SignedIn } from '../http/person.js';

/** Signs a person in: passport gives the session a new id, so one planted before is worth nothing. */
export const startSession = (request: Request, person: SignedIn): Promise<void> =>
  new Promise((resolve, reject) => {
    request.logIn(person as never, (fault: unknown) => {
      if (fault) return reject(fault as Error);
      (request.session as unknown as { userAgent: string }).userAgent = (
        request.headers['user-agent'] ?? ''
      ).slice(0, 200);
      request.session.save((lost: unknown) => (lost ? reject(lost as Error) : resolve()));
    });
  });

export const endSession = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    if (!request.session) return resolve();
    request.session.destroy((fault: unknown) => (fault ? reject(fault as Error) : resolve()));
  });
