import type { ProcedureDocument } from '../document';
import { canonicalJson } from './canonical-json';
import type { EventDraft, EventEnvelope, RunEvent, RunHeader } from './run-event';
import { sha256Hex } from './sha256';

/** What the shell knows about an event that the core cannot: who, where, when, and its place. */
export type EventPlace = Pick<
  EventEnvelope,
  'seq' | 'id' | 'at' | 'elapsed' | 'actor' | 'device' | 'build' | 'prev'
> & {
  readonly runId: string;
};

export type ChainVerdict =
  { readonly ok: true; readonly head: string } | { readonly ok: false; readonly seq: number; readonly what: string };

/** The hash that the first event's `prev` must be. */
export function headerHash(header: RunHeader): string {
  return sha256Hex(canonicalJson(header));
}

/** What a version is frozen by: the hash of the document's canonical JSON. */
export function contentHash(document: ProcedureDocument): string {
  return sha256Hex(canonicalJson(document));
}

/** The hash that an event must carry: over all of it but the hash itself. */
export function eventHash(event: Omit<RunEvent, 'hash'>): string {
  const { hash: _own, ...rest } = event as RunEvent;
  return sha256Hex(canonicalJson(rest));
}

/** Gives a draft its place in the chain. */
export function sealEvent(draft: EventDraft, place: EventPlace): RunEvent {
  const unsealed = { ...place, schema: 1, type: draft.type, data: draft.data } as Omit<RunEvent, 'hash'>;
  return { ...unsealed, hash: eventHash(unsealed) } as RunEvent;
}

/** Checks a run's whole chain from its header on: numbering, the run, each `prev` and each hash. */
export function verifyChain(header: RunHeader, events: readonly RunEvent[]): ChainVerdict {
  let head = headerHash(header);
  let seq = 0;
  for (const event of events) {
    seq += 1;
    const what = brokenLink(header, event, seq, head);
    if (what !== undefined) return { ok: false, seq, what };
    head = event.hash;
  }
  return { ok: true, head };
}

/** Says what is wrong with one link, given the seq and the head that it must follow on; undefined when it holds. */
export function brokenLink(header: RunHeader, event: RunEvent, seq: number, prev: string): string | undefined {
  if (event.runId !== header.runId) return `event ${seq} belongs to another run`;
  if (event.seq !== seq) return `event ${seq} is missing: the next one is numbered ${event.seq}`;
  if (event.prev !== prev) return `event ${seq} does not follow on the one before it`;
  if (event.hash !== hashOrNothing(event)) return `event ${seq} was changed after it was written`;
  return undefined;
}

function hashOrNothing(event: RunEvent): string | undefined {
  try {
    return eventHash(event);
  } catch (error) {
    // canonicalJson throws TypeError (or Error for NaN) on what JSON cannot hold: such an event never had a hash.
    if (error instanceof Error) return undefined;
    throw error;
  }
}
