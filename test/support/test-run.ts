import { v7 as uuidv7 } from 'uuid';
import { compileProcedure } from '../../procedures/document';
import {
  headerHash,
  sealEvent,
  type BegunAgain,
  type EventDraft,
  type RunEvent,
  type RunHeader,
} from '../../procedures/engine';
import { openingFacts, RunWalk } from '../../procedures/engine/testing/run-walk';
import { smallProcedure } from '../../procedures/engine/testing/small-procedure';
import { demoPeople, demoSites } from '../../server/database/demo/demo-garage';
import { gaugeG12, scanToolS3 } from './ossenholt-gear';
import { publishDocument } from './publish-document';
import type { TestServer } from './test-server';

export { smallProcedure };

/** A run as a tablet sends it. */
export interface SentRun {
  readonly header: RunHeader;
  readonly events: RunEvent[];
}

/** Who wrote the events, and where. */
export interface Writer {
  readonly device: string;
  readonly actor?: string;
  readonly build?: string;
}

export const okaforId = demoPeople[0]!.id;
export const adeyemiId = demoPeople[1]!.id;
export const brandtId = demoPeople[2]!.id;
export const lindqvistId = demoPeople[3]!.id;

/** Publishes the procedure that the specs run; gives its version. */
export const publishSmallProcedure = (server: TestServer): Promise<number> => publishDocument(server, smallProcedure);

/** A run that was just opened: opened, first step claimed. `again`: why, beside others that were known. */
export function openedRun(writer: Writer, header: Partial<RunHeader> = {}, again?: BegunAgain): SentRun {
  const facts = { ...openingFacts, ...(again === undefined ? {} : { again }) };
  return sent(new RunWalk(compiledSmall, freshHeader(header), facts), writer);
}

/** A whole run that ends in the finding that the sensor reads off, with write-up, closed. */
export function closedRun(writer: Writer, header: Partial<RunHeader> = {}): SentRun {
  const walk = new RunWalk(compiledSmall, freshHeader(header));
  walk
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gaugeG12 },
      { do: 'choose-gear', role: 'scanTool', instrument: scanToolS3 },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    );
  walk.cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '120.0', unit: 'kPa' }, { do: 'confirm' });
  if (walk.state.current?.id === 'restore') walk.do({ do: 'confirm' });
  walk.do(
    { do: 'keep-write-up', concern: 'Whistle.', cause: 'Reads off.', correction: 'Replaced.', customer: 'Mended.' },
    { do: 'close' },
  );
  return sent(walk, writer);
}

/** The run with one more event after its first `seq` (all of them unless said). */
export function continued(run: SentRun, draft: EventDraft, writer: Writer, seq = run.events.length): SentRun {
  const events = run.events.slice(0, seq);
  events.push(seal(run.header, events.at(-1), draft, writer));
  return { header: run.header, events };
}

/** A walk's events as a tablet would have sealed them. */
export function sent(walk: RunWalk, writer: Writer): SentRun {
  const events: RunEvent[] = [];
  for (const { type, data } of walk.events) {
    events.push(seal(walk.header, events.at(-1), { type, data } as EventDraft, writer));
  }
  return { header: walk.header, events };
}

function seal(header: RunHeader, before: RunEvent | undefined, draft: EventDraft, writer: Writer): RunEvent {
  const seq = (before?.seq ?? 0) + 1;
  return sealEvent(draft, {
    runId: header.runId,
    seq,
    id: uuidv7(),
    at: 1_790_000_000_000 + seq * 1000,
    elapsed: seq * 1000,
    actor: writer.actor ?? okaforId,
    device: writer.device,
    build: writer.build ?? 'spec-app',
    prev: before?.hash ?? headerHash(header),
  });
}

function freshHeader(header: Partial<RunHeader>): Partial<RunHeader> {
  return { runId: uuidv7(), visitId: uuidv7(), siteId: demoSites[0]!.id, ...header };
}

const compiled = compileProcedure(smallProcedure);
if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
const compiledSmall = compiled.procedure;
