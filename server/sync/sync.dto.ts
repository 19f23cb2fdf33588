import {
  ArrayMaxSize,
  IsArray,
  IsIn,
  IsInt,
  IsObject,
  IsOptional,
  IsString,
  IsUUID,
  Matches,
  MaxLength,
  Min,
} from 'class-validator';
import type { FindingResult } from '../../procedures/document';
import type { BegunAgain, RunHeader, RunState } from '../../procedures/engine';
import type { ColleagueOnTheWire } from '../access/access.service';
import type { GearOnTheWire } from '../gear/gear.service';
import { PlainText } from '../http/plain-text';
import { Nested } from '../http/validated';
import type { PublishedProcedure } from '../procedures/procedures.service';
import type { SiteOnTheWire } from '../sites/sites.service';
import type { VisitOnTheWire } from '../visits/visits.service';

const sha256Form = /^[0-9a-f]{64}$/;

/** A run's header. Each run of a push is checked by itself, so that a wrong one harms no other. */
export class RunHeaderDto implements RunHeader {
  @IsUUID()
  declare runId: string;

  @Matches(/^[a-z0-9-]{1,100}$/)
  declare procedureId: string;

  @IsInt()
  @Min(1)
  declare version: number;

  @Matches(sha256Form)
  declare contentHash: string;

  @IsUUID()
  declare visitId: string;

  @IsUUID()
  declare siteId: string;

  @IsIn(['real', 'practice'])
  declare kind: 'real' | 'practice';

  @IsOptional()
  @IsIn(['cold', 'warm'])
  declare half?: 'cold' | 'warm';

  @IsOptional()
  @IsUUID()
  declare pairId?: string;
}

export class PushedRun {
  @IsObject()
  declare header: object;

  /** At most 20,000; checked one by one by the core's compiled schema. */
  @IsArray()
  declare events: object[];
}

export class PushedDocument {
  @IsString()
  @MaxLength(40)
  declare kind: string;

  @IsObject()
  declare document: object;
}

export class PushRequest {
  /** The enrolled tablet that signs. */
  @IsUUID()
  declare device: string;

  @IsArray()
  @ArrayMaxSize(500)
  @Nested(() => PushedRun, { each: true })
  declare runs: PushedRun[];

  @IsArray()
  @ArrayMaxSize(500)
  @Nested(() => PushedDocument, { each: true })
  declare documents: PushedDocument[];
}

/** Why one item of a push was not (wholly) taken: a problem document without an address. */
export class PushProblem {
  @IsString()
  declare type: string;

  @IsString()
  declare code: string;

  @IsString()
  declare title: string;

  @IsInt()
  declare status: number;

  @IsString()
  declare detail: string;

  /** The event that it is about. */
  @IsOptional()
  @IsInt()
  declare seq?: number;
}

/** The server's word that it holds a branch up to its head. */
export class CountersignatureDto {
  @IsString()
  declare branch: string;

  @IsInt()
  declare seq: number;

  @Matches(sha256Form)
  declare head: string;

  /** Server clock, milliseconds since 1970. */
  @IsInt()
  declare at: number;

  /** Ed25519 over the canonical JSON of `{ at, branch, head, runId, seq }`, base64url. */
  @IsString()
  declare signature: string;

  @IsUUID()
  declare key: string;
}

export class PushedRunAnswer {
  @IsString()
  declare runId: string;

  /** The highest seq of the tablet's own events that is kept, on whichever branch; 0 for none. */
  @IsInt()
  declare acceptedThrough: number;

  @IsArray()
  @Matches(sha256Form, { each: true })
  declare missingAttachments: string[];

  @IsOptional()
  @Nested(() => CountersignatureDto)
  declare countersigned?: CountersignatureDto;

  @IsOptional()
  @Nested(() => PushProblem)
  declare problem?: PushProblem;
}

export class PushedDocumentAnswer {
  @IsString()
  declare kind: string;

  @IsString()
  declare id: string;

  @IsOptional()
  @Nested(() => PushProblem)
  declare problem?: PushProblem;
}

export class PushAnswer {
  @Nested(() => PushedRunAnswer, { each: true })
  declare runs: PushedRunAnswer[];

  @Nested(() => PushedDocumentAnswer, { each: true })
  declare documents: PushedDocumentAnswer[];
}

export class PullQuery {
  /** The cursor of the pull before. */
  @IsOptional()
  @PlainText({ min: 1, max: 80 })
  declare since?: string;
}

/** Why a run was begun although others of its half were known. */
export class BegunAgainDto implements BegunAgain {
  @IsString()
  declare because: string;

  /** Those runs. */
  @IsUUID(undefined, { each: true })
  declare besides: string[];
}

/** What every tablet is told of a run, whichever tablet has it. */
export class VisitRun {
  @IsUUID()
  declare runId: string;

  @IsUUID()
  declare visitId: string;

  @IsString()
  declare procedureId: string;

  @IsString()
  declare procedureTitle: string;

  @IsOptional()
  @IsIn(['cold', 'warm'])
  declare half?: 'cold' | 'warm';

  @IsOptional()
  @IsUUID()
  declare pairId?: string;

  /** Who began it. */
  @IsString()
  declare personName: string;

  /** The tablet on which it was begun, as people call it. */
  @IsOptional()
  @IsString()
  declare tabletLabel?: string;

  /** The tablet's clock, milliseconds since 1970. */
  @IsInt()
  declare openedAt: number;

  @IsString()
  declare status: RunState['status'];

  @IsOptional()
  @IsString()
  declare verdict?: string;

  @IsOptional()
  @IsIn(['in', 'out', 'too-close', 'not-judged'])
  declare result?: FindingResult;

  @IsOptional()
  @Nested(() => BegunAgainDto)
  declare again?: BegunAgain;
}

export class PullAnswer {
  /** `<epoch>.<position>`. */
  @IsString()
  declare cursor: string;

  @IsArray()
  declare procedures: readonly PublishedProcedure[];

  @IsArray()
  declare sites: readonly SiteOnTheWire[];

  @IsArray()
  declare gear: readonly GearOnTheWire[];

  @IsArray()
  declare people: readonly ColleagueOnTheWire[];

  @IsArray()
  declare visits: readonly VisitOnTheWire[];

  /** Of all tablets. */
  @Nested(() => VisitRun, { each: true })
  declare runs: readonly VisitRun[];

  @IsArray()
  declare notices: readonly never[];
}
