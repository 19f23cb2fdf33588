import type { FindingResult } from '../../../procedures/document';
import type { RunEvent, RunHeader, RunState } from '../../../procedures/engine/showing';
import type { Countersignature, PublishedProcedure, VisitRun } from '../core/wire';

/** One row of the list: the server's projection of a run. */
export interface RecordRow {
  readonly runId: string;
  readonly procedureTitle: string;
  readonly version: number;
  readonly repairOrder: string;
  readonly car: string;
  readonly person: string;
  /** ISO 8601 or milliseconds since 1970. */
  readonly openedAt: string | number;
  readonly closedAt?: string | number | null;
  readonly status: RunState['status'];
  /** Which half of a pair; absent for a run that is none. */
  readonly half?: 'cold' | 'warm';
  /** The finding's id. */
  readonly finding?: string | null;
  /** The finding in words. */
  readonly verdict?: string | null;
  readonly result?: FindingResult | null;
}

export interface RecordPage {
  readonly total: number;
  readonly rows: readonly RecordRow[];
}

/** One run with all that is needed to replay it. */
export interface RecordDetail {
  readonly header: RunHeader;
  /** Of the run's main line. */
  readonly events: readonly RunEvent[];
  /** Other tails: two tablets went on with the same run. */
  readonly branches: readonly RecordBranch[];
  readonly countersigned: readonly BranchCountersignature[];
  readonly receivedAt?: string | number;
  readonly procedure: PublishedProcedure;
  /** What it calls, at any depth. */
  readonly called: readonly PublishedProcedure[];
  /** The tablets that wrote, as people call them. */
  readonly tablets: readonly { readonly id: string; readonly label: string }[];
  /** The runs of the same half of the same visit, this one included, the first begun first. */
  readonly sameHalf: readonly VisitRun[];
  /** What the server or an earlier build computed differently. */
  readonly discrepancies: readonly FoundDiscrepancy[];
  /** What was done without the right to do it; kept, and not part of the run. */
  readonly refused: readonly RefusedEvent[];
}

export interface RecordBranch {
  readonly branch: string;
  /** Where it parts from the main line. */
  readonly fromSeq: number;
  readonly events: readonly RunEvent[];
}

export type BranchCountersignature = Countersignature & { readonly branch?: string };

export interface FoundDiscrepancy {
  readonly seq: number;
  readonly what: string;
  readonly recorded: string;
  readonly computed: string;
  /** The builds. */
  readonly recordedBy?: string;
  readonly computedBy?: string;
}

export interface RefusedEvent {
  readonly seq: number;
  readonly event: RunEvent;
  readonly reason: string;
  readonly receivedAt: string;
}

/** Checks an answer's shape; throws RangeError when the server says something else than agreed. */
export function readRecordPage(body: unknown): RecordPage {
  if (isObject(body) && typeof body['total'] === 'number' && Array.isArray(body['rows'])) {
    return body as unknown as RecordPage;
  }
  throw new RangeError('The list of records has another shape than this build knows');
}

/** Checks an answer's shape; throws RangeError when the server says something else than agreed. */
export function readRecordDetail(body: unknown): RecordDetail {
  if (isObject(body) && isObject(body['header']) && Array.isArray(body['events']) && isObject(body['procedure'])) {
    return {
      ...(body as unknown as RecordDetail),
      called: listOf(body['called']),
      branches: listOf(body['branches']),
      sameHalf: listOf(body['sameHalf']),
      tablets: listOf(body['tablets']),
      countersigned: listOf(body['countersigned']),
      discrepancies: listOf(body['discrepancies']),
      refused: listOf(body['refused']),
    };
  }
  throw new RangeError('The record has another shape than this build knows');
}

function listOf<T>(value: unknown): readonly T[] {
  return Array.isArray(value) ? (value as readonly T[]) : [];
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
