import { In, type DataSource } from 'typeorm';
import { Person, Tablet } from '../access/access.entity';
import { AppError, UnknownTablet, WrongSignature } from '../http/problem';
import type { VisitsService } from '../visits/visits.service';
import { pull } from './pull';
import { problemOfItem } from './push-problem';
import type { RunIntake } from './run-intake';
import type { PushFacts } from './run-walk';
import type { PullAnswer, PushAnswer, PushedDocument, PushedDocumentAnswer, PushRequest } from './sync.dto';

export { countersignatureOnTheWire } from './countersigner';
export { mainBranch } from './event-place';
export { isCountersigned, ServerKeys } from './server-keys';
export { rebuildRuns } from './rebuild-runs';
export { RunRows } from './run-rows';
export { runsOfSameHalf } from './visit-runs';
export { CountersignatureDto, VisitRun } from './sync.dto';

/** Whether a tablet signed these bytes; undefined when it is not enrolled. */
export interface TabletSignatures {
  isSignedBy(tabletId: string, bytes: Buffer, signature: string): Promise<boolean | undefined>;
}

/** At least once on the wire, exactly once in effect. */
export class SyncService {
  constructor(
    private readonly database: DataSource,
    private readonly tablets: TabletSignatures,
    private readonly visits: VisitsService,
    private readonly runs: RunIntake,
    private readonly clock: () => Date,
  ) {}

  /** Takes a push in, item by item. Throws `UnknownTablet` or `WrongSignature`; then nothing of it is taken. */
  async push(push: PushRequest, bytes: Buffer, signature: string): Promise<PushAnswer> {
    const isSigned = await this.tablets.isSignedBy(push.device, bytes, signature);
    if (isSigned === undefined) throw new UnknownTablet('This tablet is not enrolled here.');
    if (!isSigned) throw new WrongSignature("The push does not carry this tablet's signature.");
    const documents: PushedDocumentAnswer[] = [];
    // Visits first: a run that is listed belongs to one.
    for (const document of push.documents) documents.push(await this.takeDocument(document, push.device));
    const facts = await this.factsFor(push);
    const runs: PushAnswer['runs'] = [];
    for (const run of push.runs) runs.push(await this.runs.take(run, facts));
    return { runs, documents };
  }

  pull(since: string | undefined): Promise<PullAnswer> {
    return pull(this.database, since, this.clock());
  }

  private async takeDocument({ kind, document }: PushedDocument, tabletId: string): Promise<PushedDocumentAnswer> {
    const { id: sentId } = document as { id?: unknown };
    const id = typeof sentId === 'string' ? sentId : '';
    try {
      if (kind !== 'visit') throw new UnknownKind(`Documents of the kind "${kind}" are not known here.`);
      await this.visits.take(document, tabletId);
      return { kind, id };
    } catch (error) {
      // A document that is refused is refused alone.
      if (error instanceof AppError) return { kind, id, problem: problemOfItem(error) };
      throw error;
    }
  }

  private async factsFor({ device, runs }: PushRequest): Promise<PushFacts> {
    const people = await this.database.getRepository(Person).find({ select: { id: true, role: true } });
    const events = runs.flatMap((run) => run.events) as { device?: unknown }[];
    const named = new Set(
      events.map((event) => event.device).filter((id) => typeof id === 'string' && uuidForm.test(id)),
    );
    const tablets = await this.database
      .getRepository(Tablet)
      .find({ select: { id: true }, where: { id: In([device, ...named]) } });
    return {
      tabletId: device,
      roles: new Map(people.map(({ id, role }) => [id, role])),
      tablets: new Set(tablets.map(({ id }) => id)),
    };
  }
}

const uuidForm = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

class UnknownKind extends AppError {
  readonly status = 422;
  readonly code = 'unknown-kind';
  readonly title = 'An unknown kind of document';
}
