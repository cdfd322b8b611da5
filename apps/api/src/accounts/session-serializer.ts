import { Injectable } from '@nestjs/common';
import { PassportSerializer } from '@nestjs/passport';
import type { SignedIn } from '../http/person.js';
import { People, toSignedIn } from './people.js';

/** The session keeps the id alone; role and name are read anew on each request, so a change holds at once. */
@Injectable()
export class SessionSerializer extends PassportSerializer {
  constructor(private readonly people: People) {
    super();
  }

  serializeUser(person: SignedIn, done: (fault: Error | null, id: string) => void): void {
    done(null, person.id);
  }

  deserializeUser(id: string, done: (fault: Error | null, person: SignedIn | null) => void): void {
    this.people.byId(id).then(
      (person) => done(null, person ? toSignedIn(person) : null),
      (fault: Error) => done(fault, null),
    );
  }
}
