import { IsNull, type DataSource, type EntityManager } from 'typeorm';
import { v7 as uuidv7 } from 'uuid';
import type { ProcedureDocument } from '../../procedures/document';
import { canonicalJson, sha256Hex } from '../../procedures/engine';
import { Person } from '../access/access.entity';
import { noteChange } from '../database/change-log';
import { Conflict, NotFound } from '../http/problem';
import type { Principal } from '../http/route';
import { callableVersions } from './called-versions';
import { checkedDocument, publishingProblems, requirePublishable } from './checked-document';
import type { DraftAnswer, DraftDetail, ProcedureSummary, PublicationAnswer } from './procedures.dto';
import { ProcedureDraft, ProcedureVersion } from './procedures.entity';
import { summariesOf } from './summaries';

export { PublishedProcedure } from './procedures.dto';
export { publishedVersion, type PublishedVersion } from './published-version';
export { publishedProcedures } from './published-procedures';
export { CompiledProcedures } from './compiled-procedures';
export { calledVersions } from './called-versions';

/** Drafts, and what becomes of them: versions that never change, and their withdrawal. */
export class ProceduresService {
  constructor(
    private readonly database: DataSource,
    private readonly clock: () => Date,
  ) {}

  list(): Promise<readonly ProcedureSummary[]> {
    return summariesOf(this.database.manager);
  }

  /**
   * Keeps a document as a draft, in place of an earlier one that was not published. Throws `Invalid`, or `Conflict` when
   * the version that new runs take, or the draft that waits, says exactly the same; then nothing is changed.
   */
  async importDraft(sent: object, person: Principal): Promise<DraftAnswer> {
    const document = checkedDocument(sent);
    const text = canonicalJson(document);
    const draft = {
      id: uuidv7(),
      procedureId: document.id,
      title: document.title,
      document: text,
      contentHash: sha256Hex(text),
      importedBy: person.personId,
      importedAt: this.clock(),
    };
    await this.database.transaction(async (manager) => {
      await lockProcedure(manager, document.id);
      await this.refuseTheSame(manager, draft);
      await manager.delete(ProcedureDraft, { procedureId: document.id, publishedVersion: IsNull() });
      await manager.insert(ProcedureDraft, draft);
    });
    const published = await callableVersions(this.database.manager, document);
    return { id: draft.id, procedureId: document.id, problems: publishingProblems(document, published) };
  }

  /** A draft that waits, with its document. Throws `NotFound`. */
  async draft(draftId: string): Promise<DraftDetail> {
    const { manager } = this.database;
    const draft = await manager.findOneBy(ProcedureDraft, { id: draftId, publishedVersion: IsNull() });
    if (draft === null) throw new NotFound('There is no such draft.');
    const importer = await manager.findOneBy(Person, { id: draft.importedBy });
    const document = JSON.parse(draft.document) as ProcedureDocument;
    return {
      id: draft.id,
      title: draft.title,
      contentHash: draft.contentHash,
      procedureId: draft.procedureId,
      importedAt: draft.importedAt.toISOString(),
      importedBy: importer?.displayName ?? '',
      problems: publishingProblems(document, await callableVersions(manager, document)),
      document,
    };
  }

  /** Publishes a draft as the next version. Throws `NotFound`, `Invalid` while its lint has errors, or `Conflict` when it is published. */
  async publish(draftId: string, person: Principal): Promise<PublicationAnswer> {
    return this.database.transaction(async (manager) => {
      const draft = await manager.findOne(ProcedureDraft, {
        where: { id: draftId },
        lock: { mode: 'pessimistic_write' },
      });
      if (draft === null) throw new NotFound('There is no such draft.');
      if (draft.publishedVersion !== null)
        throw new Conflict(`This draft is version ${draft.publishedVersion} already.`);
      const document = JSON.parse(draft.document) as ProcedureDocument;
      requirePublishable(document, await callableVersions(manager, document));
      // Two drafts of one procedure at once would both take the same number.
      await lockProcedure(manager, draft.procedureId);
      const version = await this.nextVersion(manager, draft);
      const published = {
        procedureId: draft.procedureId,
        version,
        title: draft.title,
        document: draft.document,
        contentHash: draft.contentHash,
        publishedBy: person.personId,
        publishedAt: this.clock(),
      };
      await manager.insert(ProcedureVersion, published);
      await manager.update(ProcedureDraft, { id: draftId }, { publishedVersion: version });
      await noteChange(manager, 'procedure', `${draft.procedureId}/${version}`);
      return {
        id: draft.procedureId,
        version,
        status: 'published',
        publishedAt: published.publishedAt.toISOString(),
        publishedBy: await this.nameOf(manager, person),
        contentHash: draft.contentHash,
      };
    });
  }

  /** Says that a version must start no new run. Throws `NotFound`, or `Conflict` when that was said before. */
  async withdraw(procedureId: string, version: number, reason: string, person: Principal): Promise<void> {
    await this.database.transaction(async (manager) => {
      if (!(await manager.existsBy(ProcedureVersion, { procedureId, version }))) {
        throw new NotFound('There is no such version.');
      }
      const withdrawn: unknown[] = await manager.query(
        `INSERT INTO procedure_withdrawal (procedure_id, version, reason, withdrawn_by, withdrawn_at)
         VALUES ($1, $2, $3, $4, $5) ON CONFLICT DO NOTHING RETURNING version`,
        [procedureId, version, reason, person.personId, this.clock()],
      );
      if (withdrawn.length === 0) throw new Conflict('This version is withdrawn already.');
      await noteChange(manager, 'procedure', `${procedureId}/${version}`);
    });
  }

  private async nextVersion(manager: EntityManager, { procedureId }: ProcedureDraft): Promise<number> {
    return 1 + ((await manager.maximum(ProcedureVersion, 'version', { procedureId })) ?? 0);
  }

  private async refuseTheSame(
    manager: EntityManager,
    { procedureId, contentHash }: Pick<ProcedureDraft, 'procedureId' | 'contentHash'>,
  ): Promise<void> {
    const [standing] = await manager.query<{ version: number; content_hash: string }[]>(
      `SELECT version, content_hash FROM procedure_version v WHERE procedure_id = $1
       AND NOT EXISTS (SELECT FROM procedure_withdrawal w WHERE (w.procedure_id, w.version) = (v.procedure_id, v.version))
       ORDER BY version DESC LIMIT 1`,
      [procedureId],
    );
    if (standing?.content_hash === contentHash) {
      throw new Conflict(`Version ${standing.version} says exactly the same: nothing was changed.`);
    }
    if (await manager.existsBy(ProcedureDraft, { procedureId, contentHash, publishedVersion: IsNull() })) {
      throw new Conflict('The draft that waits says exactly the same: nothing was changed.');
    }
  }

  private async nameOf(manager: EntityManager, { personId, displayName }: Principal): Promise<string> {
    const person = await manager.findOneBy(Person, { id: personId });
    return person?.displayName ?? displayName;
  }
}

/** Until the transaction ends nobody else brings in or publishes a draft of this procedure. */
async function lockProcedure(manager: EntityManager, procedureId: string): Promise<void> {
  await manager.query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`procedure/${procedureId}`]);
}
