import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { permissionTable, type Permission, type Role } from '@windchest/contracts';
import { Op, type WhereOptions } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { Steps } from '../database/steps.js';
import type { Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { Person } from './person.model.js';

/** Run in the transaction that verifies an address, by the rooms that keep things for that address. */
@Injectable()
export class AddressVerifiedSteps extends Steps<SignedIn> {}

export const toSignedIn = (person: Person): SignedIn => ({
  id: person.id,
  email: person.email,
  name: person.name,
  role: person.role,
  isVerified: person.verifiedAt !== null,
});

/** Finding and keeping people. Addresses are stored in small letters. */
@Injectable()
export class People {
  constructor(
    @InjectModel(Person) private readonly people: typeof Person,
    private readonly clock: Clock,
    private readonly verified: AddressVerifiedSteps,
  ) {}

  byId(id: string, tx?: Tx): Promise<Person | null> {
    return this.people.findByPk(id, { transaction: tx ?? null });
  }

  byEmail(email: string, tx?: Tx): Promise<Person | null> {
    return this.people.findOne({ where: { email }, transaction: tx ?? null });
  }

  /** Who has proved to own an address, for rooms that keep things by address. */
  async verifiedIdByEmail(email: string, tx?: Tx): Promise<string | null> {
    const person = await this.byEmail(email, tx);
    return person?.verifiedAt ? person.id : null;
  }

  create(
    tx: Tx,
    person: { email: string; name: string; role?: Role; passphraseHash?: string | null },
  ): Promise<Person> {
    const now = this.clock.now();
    return this.people.create(
      { id: newId(), role: 'buyer', passphraseHash: null, ...person, createdAt: now, updatedAt: now },
      { transaction: tx },
    );
  }

  async change(
    tx: Tx,
    person: Person,
    changes: Partial<Pick<Person, 'name' | 'role' | 'passphraseHash'>>,
  ): Promise<void> {
    await person.update({ ...changes, updatedAt: this.clock.now() }, { transaction: tx });
  }

  /** Marks an address as proved, once, and lets other rooms join what waited for it. */
  async verify(tx: Tx, person: Person): Promise<void> {
    if (person.verifiedAt) return;
    await person.update({ verifiedAt: this.clock.now(), updatedAt: this.clock.now() }, { transaction: tx });
    await this.verified.run(tx, toSignedIn(person));
  }

  async list(query: {
    page: number;
    size: number;
    search?: string | undefined;
    role?: Role | undefined;
  }): Promise<{ rows: Person[]; count: number }> {
    const like = `%${query.search ?? ''}%`;
    const where: WhereOptions = {
      ...(query.role ? { role: query.role } : {}),
      ...(query.search ? { [Op.or]: [{ email: { [Op.like]: like } }, { name: { [Op.like]: like } }] } : {}),
    };
    return this.people.findAndCountAll({
      where,
      order: [
        ['createdAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
  }

  /** Everybody whose role carries a permission and whose address is proved, oldest account first. */
  allowedTo(permission: Permission, tx?: Tx): Promise<Person[]> {
    return this.people.findAll({
      where: { role: [...permissionTable[permission]], verifiedAt: { [Op.ne]: null } },
      order: [['createdAt', 'ASC']],
      transaction: tx ?? null,
    });
  }

  countOwners(tx: Tx): Promise<number> {
    return this.people.count({ where: { role: 'owner' }, transaction: tx });
  }
}
