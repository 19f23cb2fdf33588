import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { RunState } from '../../../procedures/engine/showing';
import { readRecordDetail, readRecordPage, type RecordDetail, type RecordPage } from './record-wire';

/** What the list is asked for. */
export interface RecordQuery {
  /** Free text over order, car, person, procedure and verdict. */
  readonly text: string;
  /** A finding's id; empty for any. */
  readonly finding: string;
  /** A run's state; empty for any. */
  readonly status: RunState['status'] | '';
  readonly sort: RecordSort;
}

/** The column, with a minus in front for the newest or last first. */
export type RecordSort = `${'' | '-'}${RecordColumn}`;

export type RecordColumn = 'openedAt' | 'repairOrder' | 'car' | 'person' | 'procedureTitle' | 'status' | 'verdict';

/** The server's records: read only. */
@Injectable({ providedIn: 'root' })
export class RecordArchive {
  private readonly http = inject(HttpClient);

  /** One page of the list, pages counted from 1. Fails with `ApiProblem`. */
  async page(query: RecordQuery, page: number): Promise<RecordPage> {
    const { text, finding, status, sort } = query;
    const params = {
      ...(text === '' ? {} : { text }),
      ...(finding === '' ? {} : { finding }),
      ...(status === '' ? {} : { status }),
      sort,
      page,
    };
    return readRecordPage(await firstValueFrom(this.http.get<unknown>('/api/records', { params })));
  }

  /** The bytes of an attachment as they were stored. Fails with `ApiProblem`. */
  async attachment(sha256: string): Promise<Uint8Array> {
    const url = `/api/attachments/${sha256}`;
    return new Uint8Array(await firstValueFrom(this.http.get(url, { responseType: 'arraybuffer' })));
  }
}

/** One record, fetched anew when the run changes; nothing while there is none. Call it in an injection context. */
export function recordResource(runId: () => string | undefined): HttpResourceRef<RecordDetail | undefined> {
  const url = (): string | undefined => {
    const id = runId();
    return id === undefined ? undefined : `/api/records/${encodeURIComponent(id)}`;
  };
  return httpResource(url, { parse: readRecordDetail });
}
