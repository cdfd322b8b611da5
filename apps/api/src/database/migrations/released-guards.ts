export const REFUSE = `SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A released revision never changes.'`;
const isFinal = (revisionId: string): string =>
  `EXISTS (SELECT 1 FROM revisions WHERE id = ${revisionId} AND state IN ('released', 'withdrawn'))`;

/** Triggers that keep what a released revision holds in a table as it is. The table has a `revision_id`. */
export const guardContents = (table: string): string[] =>
  (['INSERT', 'UPDATE', 'DELETE'] as const).map((verb) => {
    const owners = { INSERT: ['NEW'], UPDATE: ['OLD', 'NEW'], DELETE: ['OLD'] }[verb];
    return `CREATE TRIGGER ${table}_of_released_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW
      IF ${owners.map((row) => isFinal(`${row}.revision_id`)).join(' OR ')} THEN ${REFUSE}; END IF`;
  });
