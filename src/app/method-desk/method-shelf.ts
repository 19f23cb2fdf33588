import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { readDraft, readProcedureList, type DraftDetail, type ProcedureSummary } from './method-wire';

/** What became of an import: the draft, with what keeps it from being published. */
export type ImportedDraft = Pick<DraftDetail, 'id' | 'procedureId' | 'problems'>;

/** The server's procedures: every write fails with `ApiProblem`, and then nothing has changed. */
@Injectable({ providedIn: 'root' })
export class MethodShelf {
  private readonly http = inject(HttpClient);

  /** Brings a document in as a draft, in place of an earlier draft of the same procedure. 422 names what is wrong. */
  async importDraft(document: object): Promise<ImportedDraft> {
    return firstValueFrom(this.http.post<ImportedDraft>('/api/procedures/drafts', document));
  }

  /** Makes a draft the next version, which never changes again. */
  async publish(draftId: string): Promise<{ readonly id: string; readonly version: number }> {
    const url = `/api/procedures/drafts/${encodeURIComponent(draftId)}/publication`;
    return firstValueFrom(this.http.post<{ id: string; version: number }>(url, {}));
  }

  /** No new run starts on a withdrawn version. */
  async withdraw(procedureId: string, version: number, reason: string): Promise<void> {
    const url = `/api/procedures/${encodeURIComponent(procedureId)}/versions/${version}/withdrawal`;
    await firstValueFrom(this.http.post(url, { reason }));
  }
}

/** All procedures with their versions. Call it in an injection context. */
export function procedureListResource(): HttpResourceRef<readonly ProcedureSummary[] | undefined> {
  return httpResource(() => '/api/procedures', { parse: readProcedureList });
}

/** One draft with its document; nothing while there is no id. Call it in an injection context. */
export function draftResource(draftId: () => string | undefined): HttpResourceRef<DraftDetail | undefined> {
  const url = (): string | undefined => {
    const id = draftId();
    return id === undefined ? undefined : `/api/procedures/drafts/${encodeURIComponent(id)}`;
  };
  return httpResource(url, { parse: readDraft });
}
