/** The tables in which nothing is ever changed or removed: refused by grants and by triggers. */
export const appendOnlyTables = [
  'run_event',
  'procedure_version',
  'procedure_withdrawal',
  'countersignature',
  'refused_event',
  'discrepancy',
  'attachment',
  'visit_revision',
] as const;
