import type { LetterBody } from '@windchest/contracts';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { TestApp } from './test-app.js';

/** A service letter to the owners of a kit, with every switch as the page sets it. */
export const letterOf = (
  kitId: string | null,
  {
    audience,
    ...more
  }: Partial<Omit<LetterBody, 'audience'>> & { audience?: Partial<LetterBody['audience']> } = {},
): LetterBody => ({
  kind: 'service',
  subject: '{kit}: what {newest} mends',
  body: 'Hello {name},\n\nyou hold {held}.\n\n{reprint_list}\n\n{download_link}\n',
  kitId,
  revisionId: null,
  leavesOutUnneeded: true,
  perMinute: 100_000,
  ...more,
  audience: {
    ownsKit: kitId !== null,
    heldFromId: null,
    heldToId: null,
    withNothingHeld: true,
    sources: [],
    nozzlesMm: [],
    materials: [],
    reportedParts: [],
    countries: [],
    askedForNews: false,
    ...audience,
  },
});

/** A report that J-01 sits tight, printed in PETG with a nozzle of 0.4 mm. */
export const putFitReport = (
  shop: TestApp,
  personId: string,
  of: { kitId: string; revisionId: string },
): Promise<number> =>
  touchRows(
    shop.database,
    `INSERT INTO fit_reports (id, kit_id, revision_id, part_code, part_name, person_id, printer_name, material, nozzle_mm, layer_mm, verdict, words, created_at, updated_at)
     VALUES (:id, :kitId, :revisionId, 'J-01', 'Tongue', :personId, '', 'PETG', 0.4, 0.2, 'tight', '', :now, :now)`,
    { id: newId(), ...of, personId, now: shop.clock.now() },
  );

/** A printer with a nozzle of 0.6 mm and ASA. */
export const putPrinter = (shop: TestApp, personId: string): Promise<number> =>
  touchRows(
    shop.database,
    `INSERT INTO printer_cards (id, person_id, name, bed_x_mm, bed_y_mm, bed_z_mm, nozzle_mm, materials, is_main, created_at, updated_at)
     VALUES (:id, :personId, 'Box', 200, 200, 200, 0.6, '[{"material":"ASA"}]', TRUE, :now, :now)`,
    { id: newId(), personId, now: shop.clock.now() },
  );
