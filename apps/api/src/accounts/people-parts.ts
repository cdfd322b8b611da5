import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { SqlPart } from '../database/sql-part.js';

export interface PrinterFacts {
  readonly nozzlesMm: readonly number[];
  readonly materials: readonly string[];
}

/** People and their printers as parts of other rooms' queries. */
@Injectable()
export class PeopleParts {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  /** Columns `id`, `email`, `name`, `is_verified`. */
  people(): SqlPart {
    return { sql: 'SELECT id, email, name, verified_at IS NOT NULL AS is_verified FROM people', values: {} };
  }

  /** One column: the ids of those with a printer that has one of the nozzles and one of the materials. */
  withPrinter({ nozzlesMm, materials }: PrinterFacts): SqlPart {
    const wishes = [
      nozzlesMm.length > 0 ? 'ROUND(nozzle_mm, 2) IN (:cardNozzles)' : undefined,
      materials.length > 0
        ? `EXISTS (SELECT 1 FROM JSON_TABLE(materials, '$[*]' COLUMNS (material VARCHAR(40) PATH '$.material')) m WHERE m.material IN (:cardMaterials))`
        : undefined,
    ].filter((wish) => wish !== undefined);
    return {
      sql: `SELECT person_id FROM printer_cards WHERE ${wishes.join(' AND ') || 'TRUE'}`,
      values: { cardNozzles: nozzlesMm, cardMaterials: materials },
    };
  }

  /** What printer cards name, to choose from. */
  async printerChoices(): Promise<PrinterFacts> {
    const [nozzles, materials] = await Promise.all([
      selectRows<{ one: number | string }>(
        this.database,
        'SELECT DISTINCT ROUND(nozzle_mm, 2) AS one FROM printer_cards ORDER BY one LIMIT 50',
      ),
      selectRows<{ one: string }>(
        this.database,
        `SELECT DISTINCT m.material AS one FROM printer_cards c, JSON_TABLE(c.materials, '$[*]' COLUMNS (material VARCHAR(40) PATH '$.material')) m ORDER BY one LIMIT 100`,
      ),
    ]);
    return {
      nozzlesMm: nozzles.map(({ one }) => Number(one)),
      materials: materials.map(({ one }) => one),
    };
  }
}
