import { QueryTypes, type QueryInterface, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import * as people from './migrations/0001-people.js';
import * as outbox from './migrations/0002-outbox.js';
import * as catalogue from './migrations/0003-catalogue.js';
import * as sales from './migrations/0004-sales.js';
import * as releasedIsFinal from './migrations/0005-released-is-final.js';
import * as taxRates from './migrations/0006-tax-rates.js';
import * as printProfiles from './migrations/0007-print-profiles.js';
import * as meshComparisons from './migrations/0008-mesh-comparisons.js';
import * as printerCards from './migrations/0009-printer-cards.js';
import * as partVariants from './migrations/0010-part-variants.js';
import * as refunds from './migrations/0011-refunds.js';
import * as supporters from './migrations/0012-supporters.js';
import * as couponRules from './migrations/0013-coupon-rules.js';
import * as taxAndBusiness from './migrations/0014-tax-and-business.js';
import * as gifts from './migrations/0015-gifts.js';
import * as journal from './migrations/0016-journal.js';
import * as fitReports from './migrations/0017-fit-reports.js';
import * as letters from './migrations/0018-letters.js';
import * as printRecord from './migrations/0019-print-record.js';

const migrations: Record<string, { up: (database: QueryInterface) => Promise<void> }> = {
  '0001-people': people,
  '0002-outbox': outbox,
  '0003-catalogue': catalogue,
  '0004-sales': sales,
  '0005-released-is-final': releasedIsFinal,
  '0006-tax-rates': taxRates,
  '0007-print-profiles': printProfiles,
  '0008-mesh-comparisons': meshComparisons,
  '0009-printer-cards': printerCards,
  '0010-part-variants': partVariants,
  '0011-refunds': refunds,
  '0012-supporters': supporters,
  '0013-coupon-rules': couponRules,
  '0014-tax-and-business': taxAndBusiness,
  '0015-gifts': gifts,
  '0016-journal': journal,
  '0017-fit-reports': fitReports,
  '0018-letters': letters,
  '0019-print-record': printRecord,
};

/**
 * Runs what has not run yet, forward only. A named lock of the database server lets one of several
 * starting processes migrate while the others wait; a lock belongs to one connection, so the pool's
 * connection is pinned by a transaction for as long.
 */
export const migrate = async (database: Sequelize): Promise<string[]> => {
  const lock = await database.transaction();
  try {
    const [row] = await database.query<{ got: number | null }>(
      "SELECT GET_LOCK('windchest-migrations', 120) AS got",
      {
        type: QueryTypes.SELECT,
        transaction: lock,
      },
    );
    if (row?.got !== 1)
      throw new Error(
        'Another process has been migrating the database for two minutes; start again when it is done.',
      );
    const context = database.getQueryInterface();
    const umzug = new Umzug<QueryInterface>({
      migrations: Object.entries(migrations).map(([name, { up }]) => ({ name, up: () => up(context) })),
      context,
      storage: new SequelizeStorage({ sequelize: database, tableName: 'schema_migrations' }),
      logger: undefined,
    });
    const done = await umzug.up();
    return done.map((one) => one.name);
  } finally {
    // The connection goes back to the pool alive: without this a failed migration would block every other process.
    // Also after a fault: the pooled connection would keep the lock, and with it every other process waiting.
    await database.query("DO RELEASE_LOCK('windchest-migrations')", { transaction: lock });
    await lock.rollback();
  }
};
