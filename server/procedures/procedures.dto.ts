import { IsIn, IsInt, IsISO8601, IsObject, IsOptional, IsString, IsUUID } from 'class-validator';
import type { ProcedureDocument } from '../../procedures/document';
import { PlainText } from '../http/plain-text';
import { Nested } from '../http/validated';

/** Why a version starts no new run, and who said so. */
export class Withdrawal {
  @IsString()
  declare reason: string;

  @IsString()
  declare by: string;

  @IsISO8601()
  declare at: string;
}

export class VersionSummary {
  @IsInt()
  declare version: number;

  @IsIn(['published', 'withdrawn'])
  declare status: 'published' | 'withdrawn';

  @IsISO8601()
  declare publishedAt: string;

  /** The person's name as records show it. */
  @IsString()
  declare publishedBy: string;

  @IsString()
  declare contentHash: string;

  @IsOptional()
  @Nested(() => Withdrawal)
  declare withdrawal?: Withdrawal;
}

/** What keeps a draft from being published. */
export class DraftProblem {
  /** JSON pointer into the document; empty for the whole of it. */
  @IsString()
  declare pointer: string;

  @IsString()
  declare detail: string;
}

export class DraftSummary {
  @IsUUID()
  declare id: string;

  /** The document's own, which may be another than that of the versions. */
  @IsString()
  declare title: string;

  @IsString()
  declare contentHash: string;

  @IsISO8601()
  declare importedAt: string;

  @IsString()
  declare importedBy: string;

  /** What has to be mended before it can be published. */
  @Nested(() => DraftProblem, { each: true })
  declare problems: DraftProblem[];
}

/** A draft with its document. */
export class DraftDetail extends DraftSummary {
  @IsString()
  declare procedureId: string;

  @IsObject()
  declare document: ProcedureDocument;
}

export class ProcedureSummary {
  @IsString()
  declare id: string;

  /** Of the newest published version, else of the draft, else of the newest withdrawn one. */
  @IsString()
  declare title: string;

  @Nested(() => VersionSummary, { each: true })
  declare versions: VersionSummary[];

  @IsOptional()
  @Nested(() => DraftSummary)
  declare draft?: DraftSummary;
}

export class DraftAnswer {
  @IsUUID()
  declare id: string;

  @IsString()
  declare procedureId: string;

  @Nested(() => DraftProblem, { each: true })
  declare problems: DraftProblem[];
}

/** A published version without its document. */
export class PublicationAnswer extends VersionSummary {
  @IsString()
  declare id: string;
}

/** A published version on the wire. */
export class PublishedProcedure extends PublicationAnswer {
  @IsObject()
  declare document: ProcedureDocument;
}

export class WithdrawalRequest {
  @PlainText({ min: 1, max: 1000 })
  declare reason: string;
}
