import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { StaffLog } from './staff-log.js';
import { Staff } from './staff.js';

@Controller()
export class StaffController {
  constructor(
    private readonly staff: Staff,
    private readonly staffLog: StaffLog,
  ) {}

  @Endpoint('GET /workshop/people')
  list(@Input() input: Handled<'GET /workshop/people'>): Promise<Answer<'GET /workshop/people'>> {
    return this.staff.list(input);
  }

  @Endpoint('PATCH /workshop/people/:personId')
  setRole(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'PATCH /workshop/people/:personId'>,
  ): Promise<Answer<'PATCH /workshop/people/:personId'>> {
    return this.staff.setRole(person, input);
  }

  @Endpoint('POST /workshop/invitations')
  invite(
    @ThisPerson() person: SignedIn,
    @Input() input: Handled<'POST /workshop/invitations'>,
  ): Promise<void> {
    return this.staff.invite(person, input);
  }

  @Endpoint('GET /workshop/log')
  log(@Input() { query }: Handled<'GET /workshop/log'>): Promise<Answer<'GET /workshop/log'>> {
    return this.staffLog.list(query);
  }
}
