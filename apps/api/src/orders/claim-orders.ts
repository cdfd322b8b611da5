import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { AddressVerifiedSteps } from '../accounts/people.js';
import { Clock } from '../adapters/clock/clock.js';
import { touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';

/** An account takes up the orders its address placed as a guest, once the address is verified. */
@Injectable()
export class ClaimOrders implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly addressVerified: AddressVerifiedSteps,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.addressVerified.register({
      name: 'orders',
      order: 10,
      run: (tx, person) => this.claim(tx, person.id, person.email),
    });
  }

  private async claim(tx: Tx, personId: string, email: string): Promise<void> {
    await touchRows(
      this.database,
      'UPDATE orders SET person_id = :personId, updated_at = :now WHERE email = :email AND person_id IS NULL',
      { personId, email, now: this.clock.now() },
      tx,
    );
  }
}
