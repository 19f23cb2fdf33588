import type { EntityManager } from 'typeorm';
import type { RunHeader } from '../../procedures/engine';
import type { RecordColumn, RecordPage, RecordRow, RecordsQuery } from './records.dto';

const pageSize = 50;

/** Columns by which the list is ordered; the answers' names are not the table's. */
const orderBy: Readonly<Record<RecordColumn, string>> = {
  openedAt: 'opened_at',
  closedAt: 'closed_at',
  repairOrder: 'repair_order',
  car: 'car',
  person: 'person_name',
  procedureTitle: 'procedure_title',
  verdict: 'verdict',
  finding: 'finding',
  status: 'status',
};

interface ListedRow {
  run_id: string;
  header: string;
  procedure_title: string;
  version: number;
  repair_order: string;
  car: string;
  person_name: string;
  opened_at: string;
  closed_at: string | null;
  status: RecordRow['status'];
  finding: string | null;
  verdict: string | null;
  result: RecordRow['result'] | null;
}

/** One page of the list, filtered and sorted by the database. */
export async function recordPage(manager: EntityManager, query: RecordsQuery): Promise<RecordPage> {
  const { where, values } = filterOf(query);
  const sort = query.sort ?? '-openedAt';
  const isDescending = sort.startsWith('-');
  const column = orderBy[(isDescending ? sort.slice(1) : sort) as RecordColumn];
  const direction = isDescending ? 'DESC' : 'ASC';
  // Nulls lie at one end of the index either way; naming their place otherwise would keep the index from being used.
  const order = `${column} ${direction}, run_id ${direction}`;
  const offset = (Number(query.page ?? '1') - 1) * pageSize;
  const [counted] = await manager.query<{ total: string }[]>(`SELECT count(*) AS total FROM run ${where}`, values);
  const rows = await manager.query<ListedRow[]>(
    `SELECT run_id, header, procedure_title, version, repair_order, car, person_name, opened_at, closed_at, status, finding,
       verdict, result
     FROM run ${where} ORDER BY ${order} LIMIT ${pageSize} OFFSET ${offset}`,
    values,
  );
  return { total: Number(counted?.total ?? 0), rows: rows.map(rowOnTheWire) };
}

function filterOf({ text, finding, kind, status }: RecordsQuery): { where: string; values: string[] } {
  const values: string[] = [];
  const conditions: string[] = [];
  const add = (condition: (place: string) => string, value: string) => {
    values.push(value);
    conditions.push(condition(`$${values.length}`));
  };
  for (const word of wordsOf(text ?? '')) add((place) => `searched LIKE ${place}`, `%${literally(word)}%`);
  if (finding) add((place) => `finding = ${place}`, finding);
  if (kind) add((place) => `procedure_id = ${place}`, kind);
  if (status) add((place) => `status = ${place}`, status);
  return { where: conditions.length === 0 ? '' : `WHERE ${conditions.join(' AND ')}`, values };
}

function wordsOf(text: string): readonly string[] {
  return text
    .toLowerCase()
    .split(/\s+/)
    .filter((word) => word !== '')
    .slice(0, 10);
}

/** LIKE's own signs, taken as themselves. */
function literally(word: string): string {
  return word.replaceAll(/[\\%_]/g, String.raw`\$&`);
}

function rowOnTheWire(row: ListedRow): RecordRow {
  const { half } = JSON.parse(row.header) as RunHeader;
  return {
    runId: row.run_id,
    procedureTitle: row.procedure_title,
    version: row.version,
    repairOrder: row.repair_order,
    car: row.car,
    person: row.person_name,
    openedAt: Number(row.opened_at),
    status: row.status,
    ...(half === undefined ? {} : { half }),
    ...(row.closed_at === null ? {} : { closedAt: Number(row.closed_at) }),
    ...(row.finding === null ? {} : { finding: row.finding }),
    ...(row.verdict === null ? {} : { verdict: row.verdict }),
    ...(row.result == null ? {} : { result: row.result }),
  };
}
