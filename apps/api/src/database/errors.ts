/** MariaDB's own error number: Sequelize gives some errors a wrong class, the number is always right. */
export const errnoOf = (fault: unknown): number | undefined => {
  if (typeof fault !== 'object' || fault === null) return undefined;
  const { errno, parent, original } = fault as { errno?: unknown; parent?: unknown; original?: unknown };
  if (typeof errno === 'number') return errno;
  return parent && parent !== fault
    ? errnoOf(parent)
    : original && original !== fault
      ? errnoOf(original)
      : undefined;
};

export const isDuplicate = (fault: unknown, index?: string): boolean =>
  errnoOf(fault) === 1062 &&
  (index === undefined ||
    String((fault as { parent?: { sqlMessage?: string } }).parent?.sqlMessage ?? fault).includes(index));
