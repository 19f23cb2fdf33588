import { In, type DataSource, type EntityManager } from 'typeorm';
import { validate as isUuid } from 'uuid';
import { verifyChain, type RunEvent, type RunHeader } from '../../procedures/engine';
import { Tablet } from '../access/access.entity';
import { NotFound } from '../http/problem';
import { calledVersions, publishedProcedures } from '../procedures/procedures.service';
import { countersignatureOnTheWire, isCountersigned, mainBranch, RunRows, runsOfSameHalf } from '../sync/sync.service';
import { Countersignature, DiscrepancyRow, RefusedEventRow, Run, RunBranch, ServerKey } from '../sync/sync.entity';
import { recordPage } from './record-page';
import type { ChainFound, RecordDetail, RecordPage, RecordsQuery, WritingTablet } from './records.dto';

/** The archive: read only. */
export class RecordsService {
  constructor(private readonly database: DataSource) {}

  list(query: RecordsQuery): Promise<RecordPage> {
    return recordPage(this.database.manager, query);
  }

  /** One run with all that is needed to replay and to check it. Throws `NotFound`. */
  async one(runId: string): Promise<RecordDetail> {
    return this.database.transaction('REPEATABLE READ', async (manager) => {
      const run = await manager.findOneBy(Run, { runId });
      if (run === null) throw new NotFound('There is no such record.');
      const header = JSON.parse(run.header) as RunHeader;
      const branches = await manager.find(RunBranch, { where: { runId }, order: { fromSeq: 'ASC', branch: 'ASC' } });
      const rows = new RunRows(manager, runId);
      const lines = new Map<string, readonly RunEvent[]>();
      for (const { branch, headSeq } of branches) lines.set(branch, await rows.lineage(branches, branch, headSeq));
      const signed = await manager.find(Countersignature, { where: { runId }, order: { seq: 'ASC', branch: 'ASC' } });
      const keys = await manager.findBy(ServerKey, { id: In(signed.map(({ keyId }) => keyId)) });
      const [procedure] = await publishedProcedures(manager, [`${run.procedureId}/${run.version}`]);
      if (procedure === undefined) throw new Error(`run ${runId} has no procedure`);
      const discrepancies = await manager.find(DiscrepancyRow, {
        where: { runId },
        order: { seq: 'ASC', what: 'ASC' },
      });
      const refused = await manager.find(RefusedEventRow, { where: { runId }, order: { seq: 'ASC', hash: 'ASC' } });
      return {
        header,
        events: lines.get(mainBranch) ?? [],
        branches: branches
          .filter(({ parent }) => parent !== null)
          .map(({ branch, parent, fromSeq }) => {
            return { branch, parent: parent ?? '', fromSeq, events: (lines.get(branch) ?? []).slice(fromSeq - 1) };
          }),
        countersigned: signed.map(countersignatureOnTheWire),
        receivedAt: run.receivedAt.toISOString(),
        procedure,
        called: await calledVersions(manager, procedure.document),
        tablets: await tabletsOf(manager, lines.get(mainBranch) ?? []),
        sameHalf: await runsOfSameHalf(manager, header),
        chain: chainFound(header, lines, signed, keys),
        discrepancies: discrepancies
          .filter(({ branch }) => branch === mainBranch)
          .map(({ seq, what, recorded, computed, recordedBy, computedBy }) => {
            return { seq, what, recorded, computed, recordedBy, computedBy };
          }),
        refused: refused.map(({ seq, event, reason, receivedAt }) => {
          return { seq, event: JSON.parse(event) as RunEvent, reason, receivedAt: receivedAt.toISOString() };
        }),
      };
    });
  }
}

async function tabletsOf(manager: EntityManager, events: readonly RunEvent[]): Promise<WritingTablet[]> {
  const devices = [...new Set(events.map(({ device }) => device))].filter((device) => isUuid(device));
  const tablets = await manager.findBy(Tablet, { id: In(devices) });
  return devices.flatMap((id) => {
    const label = tablets.find((tablet) => tablet.id === id)?.label;
    return label === undefined ? [] : [{ id, label }];
  });
}

/** Checks every line of the run from its header on, and every word that the server gave on it. */
function chainFound(
  header: RunHeader,
  lines: ReadonlyMap<string, readonly RunEvent[]>,
  signed: readonly Countersignature[],
  keys: readonly ServerKey[],
): ChainFound {
  const events = lines.get(mainBranch)?.length ?? 0;
  for (const line of lines.values()) {
    const verdict = verifyChain(header, line);
    if (!verdict.ok) return { whole: false, events, what: verdict.what };
  }
  for (const word of signed) {
    const { branch, seq, head, at, signature } = word;
    const key = keys.find(({ id }) => id === word.keyId);
    const holds =
      key !== undefined &&
      lines.get(branch)?.[seq - 1]?.hash === head &&
      isCountersigned(key.publicKey, { runId: header.runId, branch, seq, head, at: Number(at) }, signature);
    if (!holds) return { whole: false, events, what: `event ${seq} is not what the server countersigned` };
  }
  return { whole: true, events };
}
