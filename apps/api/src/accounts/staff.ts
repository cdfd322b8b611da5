import { Injectable } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { AccountLinks } from './account-links.js';
import { People } from './people.js';
import { Person } from './person.model.js';
import { StaffLog } from './staff-log.js';

type Row = Answer<'GET /workshop/people'>['items'][number];

/** Who works here: listing people, changing roles, inviting. */
@Injectable()
export class Staff {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly links: AccountLinks,
    private readonly staffLog: StaffLog,
  ) {}

  async list({ query }: Handled<'GET /workshop/people'>): Promise<Answer<'GET /workshop/people'>> {
    const { rows, count } = await this.people.list(query);
    return { items: rows.map(toRow), page: query.page, size: query.size, total: count };
  }

  setRole(by: SignedIn, { params, body }: Handled<'PATCH /workshop/people/:personId'>): Promise<Row> {
    return this.transactions.run(async (tx) => {
      const person = await this.people.byId(params.personId, tx);
      if (!person) throw notFound('person');
      const before = person.role;
      if (before === body.role) return toRow(person);
      if (before === 'owner' && (await this.people.countOwners(tx)) === 1)
        throw new Refusal('conflict', 'The workshop needs an owner. Make somebody else an owner first.');
      await this.people.change(tx, person, { role: body.role });
      await this.staffLog.record(tx, by, {
        what: 'changed a role',
        subject: person.email,
        before: { role: before },
        after: { role: body.role },
      });
      return toRow(person);
    });
  }

  invite(by: SignedIn, { body }: Handled<'POST /workshop/invitations'>): Promise<void> {
    return this.transactions.run(async (tx) => {
      const known = await this.people.byEmail(body.email, tx);
      if (known)
        throw new Refusal(
          'already-exists',
          'Somebody with this address has an account already. Change their role in the list instead.',
          { fields: { email: 'Has an account already.' } },
        );
      const person = await this.people.create(tx, { email: body.email, name: body.name, role: body.role });
      await this.links.sendInvitation(tx, person, by.name);
      await this.staffLog.record(tx, by, {
        what: 'invited',
        subject: body.email,
        after: { role: body.role },
      });
    });
  }
}

const toRow = (person: Person): Row => ({
  id: person.id,
  email: person.email,
  name: person.name,
  role: person.role,
  isVerified: person.verifiedAt !== null,
  joinedAt: person.createdAt.toISOString(),
});
