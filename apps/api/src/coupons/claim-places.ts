import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { AddressVerifiedSteps } from '../accounts/people.js';
import { Clock } from '../adapters/clock/clock.js';
import { touchRows } from '../database/rows.js';

/** What an address used of a coupon counts for its account once the address is verified. */
@Injectable()
export class ClaimPlaces implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly addressVerified: AddressVerifiedSteps,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.addressVerified.register({
      name: 'coupon places',
      order: 15,
      run: async (tx, { id, email }) => {
        await touchRows(
          this.database,
          'UPDATE coupon_places SET person_id = :id, updated_at = :now WHERE email = :email AND person_id IS NULL',
          { id, email, now: this.clock.now() },
          tx,
        );
      },
    });
  }
}
