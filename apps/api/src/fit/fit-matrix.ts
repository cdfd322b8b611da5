import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { FitMatrix, FitVerdict, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import { summarize, type FitWord } from './fit-statistics.js';

interface Row {
  partCode: string;
  partName: string;
  material: string;
  verdict: FitVerdict;
  gapMm: string | number | null;
}

/** The newest of these are looked at: an old kit's first printers should not outvote the last ones for ever. */
const MOST_REPORTS = 5000;

/** Part by material: how parts come out, and the change that would make them fit. */
@Injectable()
export class FitMatrices {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async of({ params, query }: Handled<'GET /workshop/kits/:kitId/fit-matrix'>): Promise<FitMatrix> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT part_code AS partCode, part_name AS partName, material, verdict, gap_mm AS gapMm FROM fit_reports
       WHERE kit_id = :kitId AND (:revisionId IS NULL OR revision_id = :revisionId)
       ORDER BY created_at DESC LIMIT ${MOST_REPORTS}`,
      { kitId: params.kitId, revisionId: query.revisionId ?? null },
    );
    const materials = [...new Set(rows.map(({ material }) => material))].toSorted();
    const codes = [...new Set(rows.map(({ partCode }) => partCode))].toSorted();
    return {
      materials,
      rows: codes.map((partCode) => {
        const ofPart = rows.filter((row) => row.partCode === partCode);
        const cells = materials.flatMap((material) => {
          const ofCell = ofPart.filter((row) => row.material === material);
          return ofCell.length > 0 ? [[material, summarize(ofCell.map(toWord))] as const] : [];
        });
        return {
          partCode,
          partName: ofPart[0]!.partName,
          all: summarize(ofPart.map(toWord)),
          cells: Object.fromEntries(cells),
        };
      }),
    };
  }
}

const toWord = ({ verdict, gapMm }: Row): FitWord => ({
  verdict,
  gapMm: gapMm === null ? null : Number(gapMm),
});
