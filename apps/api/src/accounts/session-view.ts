import { Injectable } from '@nestjs/common';
import { permissionsOf, type Answer } from '@windchest/contracts';
import { InjectConfig, type Config } from '../config/config.js';
import type { SignedIn } from '../http/person.js';

/** The answer to "who am I here". */
@Injectable()
export class SessionView {
  constructor(@InjectConfig() private readonly config: Config) {}

  of(person: SignedIn | null): Answer<'GET /session'> {
    return {
      person: person && {
        id: person.id,
        email: person.email,
        name: person.name,
        role: person.role,
        isVerified: person.isVerified,
      },
      permissions: person ? permissionsOf(person.role) : [],
      workshop: {
        name: this.config.WORKSHOP_NAME,
        currency: this.config.WORKSHOP_CURRENCY,
        country: this.config.WORKSHOP_COUNTRY,
        locale: this.config.WORKSHOP_LOCALE,
      },
    };
  }
}
