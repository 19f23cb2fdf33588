import { Person, RefreshToken, Session, SignInAttempt, Tablet } from '../access/access.entity';
import { Attachment } from '../attachments/attachments.entity';
import { Instrument } from '../gear/gear.entity';
import { ProcedureDraft, ProcedureVersion, ProcedureWithdrawal } from '../procedures/procedures.entity';
import { Site } from '../sites/sites.entity';
import {
  Countersignature,
  DiscrepancyRow,
  RefusedEventRow,
  Run,
  RunAttachment,
  RunBranch,
  RunEventRow,
  ServerKey,
} from '../sync/sync.entity';
import { VisitRevision, VisitRow } from '../visits/visits.entity';
import { ChangeCounter, ChangeLogEntry, Epoch } from './change-log.entity';

/** Every entity, as classes: a glob would need a dynamic import, which fails in CommonJS tests. */
export const entities = [
  Attachment,
  ChangeCounter,
  ChangeLogEntry,
  Countersignature,
  DiscrepancyRow,
  Epoch,
  Instrument,
  Person,
  ProcedureDraft,
  ProcedureVersion,
  ProcedureWithdrawal,
  RefreshToken,
  RefusedEventRow,
  Run,
  RunAttachment,
  RunBranch,
  RunEventRow,
  ServerKey,
  Session,
  SignInAttempt,
  Site,
  Tablet,
  VisitRevision,
  VisitRow,
];
