import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const side = (axis: number): string => `DOUBLE AS (JSON_VALUE(measurement, '$.sizeMm[${axis}]')) PERSISTENT`;

/** People's printers, and the sizes of parts as figures, so that a list of kits can be asked what fits a bed. */
export const up = inOrder(
  `CREATE TABLE printer_cards (
    id ${ID} NOT NULL PRIMARY KEY,
    person_id ${ID} NOT NULL,
    name VARCHAR(60) NOT NULL,
    bed_x_mm DOUBLE NOT NULL,
    bed_y_mm DOUBLE NOT NULL,
    bed_z_mm DOUBLE NOT NULL,
    nozzle_mm DOUBLE NOT NULL,
    materials JSON NOT NULL,
    clearance ENUM('minus','zero','plus') NULL,
    is_main BOOLEAN NOT NULL,
    only_main TINYINT AS (IF(is_main, 1, NULL)) PERSISTENT,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    KEY printer_cards_person (person_id, created_at),
    UNIQUE KEY printer_cards_main (person_id, only_main),
    CONSTRAINT printer_cards_person_fk FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE CASCADE
  )`,
  `ALTER TABLE measurements
    ADD COLUMN width_mm ${side(0)}, ADD COLUMN depth_mm ${side(1)}, ADD COLUMN height_mm ${side(2)}`,
);
