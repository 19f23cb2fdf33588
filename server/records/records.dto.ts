import {
  IsArray,
  IsBoolean,
  IsIn,
  IsInt,
  IsISO8601,
  IsObject,
  IsOptional,
  IsString,
  IsUUID,
  Matches,
} from 'class-validator';
import type { FindingResult } from '../../procedures/document';
import type { RunEvent, RunHeader, RunState } from '../../procedures/engine';
import { PlainText } from '../http/plain-text';
import { Nested } from '../http/validated';
import { PublishedProcedure } from '../procedures/procedures.service';
import { CountersignatureDto, VisitRun } from '../sync/sync.service';

export const recordColumns = [
  'openedAt',
  'closedAt',
  'repairOrder',
  'car',
  'person',
  'procedureTitle',
  'verdict',
  'finding',
  'status',
] as const;
export type RecordColumn = (typeof recordColumns)[number];
const sorts = recordColumns.flatMap((column) => [column, `-${column}`]);

const runStates = ['open', 'set-aside', 'stopped', 'lead-called', 'closed', 'signed'] satisfies RunState['status'][];

export class RecordsQuery {
  /** Looked for in order, car, VIN, person, procedure, verdict and concern; every word must be there. */
  @IsOptional()
  @PlainText({ min: 0, max: 200 })
  declare text?: string;

  /** A finding's id. */
  @IsOptional()
  @PlainText({ min: 0, max: 100 })
  declare finding?: string;

  /** A procedure's id. */
  @IsOptional()
  @PlainText({ min: 0, max: 100 })
  declare kind?: string;

  /** A run's state. */
  @IsOptional()
  @IsIn(runStates)
  declare status?: RunState['status'];

  /** A column, with a minus in front for the last first. */
  @IsOptional()
  @IsIn(sorts)
  declare sort?: RecordColumn | `-${RecordColumn}`;

  /** From 1. */
  @IsOptional()
  @Matches(/^[1-9]\d{0,5}$/)
  declare page?: string;
}

export class RecordRow {
  @IsUUID()
  declare runId: string;

  @IsString()
  declare procedureTitle: string;

  @IsInt()
  declare version: number;

  @IsString()
  declare repairOrder: string;

  @IsString()
  declare car: string;

  @IsString()
  declare person: string;

  /** The tablet's clock, milliseconds since 1970. */
  @IsInt()
  declare openedAt: number;

  @IsOptional()
  @IsInt()
  declare closedAt?: number;

  @IsString()
  declare status: RunState['status'];

  /** Which half of a pair; absent for a run that is none. */
  @IsOptional()
  @IsIn(['cold', 'warm'])
  declare half?: 'cold' | 'warm';

  @IsOptional()
  @IsString()
  declare finding?: string;

  @IsOptional()
  @IsString()
  declare verdict?: string;

  @IsOptional()
  @IsIn(['in', 'out', 'too-close', 'not-judged'])
  declare result?: FindingResult;
}

export class RecordPage {
  @IsInt()
  declare total: number;

  @Nested(() => RecordRow, { each: true })
  declare rows: RecordRow[];
}

/** What the server found when it checked the chain just now. */
export class ChainFound {
  /** Whether every link and every countersignature holds. */
  @IsBoolean()
  declare whole: boolean;

  @IsInt()
  declare events: number;

  @IsOptional()
  @IsString()
  declare what?: string;
}

export class DiscrepancyFound {
  @IsInt()
  declare seq: number;

  @IsString()
  declare what: string;

  @IsString()
  declare recorded: string;

  @IsString()
  declare computed: string;

  @IsString()
  declare recordedBy: string;

  @IsString()
  declare computedBy: string;
}

/** A tail of the run that goes another way from one event on. */
export class RecordBranch {
  @IsString()
  declare branch: string;

  @IsString()
  declare parent: string;

  @IsInt()
  declare fromSeq: number;

  @IsArray()
  declare events: readonly RunEvent[];
}

export class RefusedEventFound {
  @IsInt()
  declare seq: number;

  @IsObject()
  declare event: RunEvent;

  @IsString()
  declare reason: string;

  @IsISO8601()
  declare receivedAt: string;
}

/** A tablet that wrote on the run, as people call it. */
export class WritingTablet {
  @IsString()
  declare id: string;

  @IsString()
  declare label: string;
}

export class RecordDetail {
  @IsObject()
  declare header: RunHeader;

  /** Of the branch `main`. */
  @IsArray()
  declare events: readonly RunEvent[];

  @Nested(() => RecordBranch, { each: true })
  declare branches: RecordBranch[];

  @Nested(() => CountersignatureDto, { each: true })
  declare countersigned: CountersignatureDto[];

  @IsISO8601()
  declare receivedAt: string;

  @Nested(() => PublishedProcedure)
  declare procedure: PublishedProcedure;

  /** What it calls, at any depth: without them it can not be replayed. */
  @Nested(() => PublishedProcedure, { each: true })
  declare called: readonly PublishedProcedure[];

  /** The enrolled tablets among those that wrote, in the order in which they did. */
  @Nested(() => WritingTablet, { each: true })
  declare tablets: WritingTablet[];

  /** The runs of the same half of the same visit, this one included, the first begun first. */
  @Nested(() => VisitRun, { each: true })
  declare sameHalf: readonly VisitRun[];

  @Nested(() => ChainFound)
  declare chain: ChainFound;

  @Nested(() => DiscrepancyFound, { each: true })
  declare discrepancies: DiscrepancyFound[];

  @Nested(() => RefusedEventFound, { each: true })
  declare refused: RefusedEventFound[];
}
