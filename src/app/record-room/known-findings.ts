import { computed, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import type { PublishedProcedure } from '../core/wire';

/** The findings that one procedure can come to. */
export interface FindingGroup {
  readonly procedure: string;
  readonly findings: readonly { readonly id: string; readonly title: string }[];
}

/** The findings of all procedures that this device has heard of, for choosing one in the list's filter. */
@Injectable({ providedIn: 'root' })
export class KnownFindings {
  private readonly store = inject(OfflineStore);

  private readonly procedures = liveRows(() => this.store.procedures.toArray());

  /** Empty until the store has answered. */
  readonly groups = computed(() => groupFindings(this.procedures() ?? []));
}

/** One group a procedure, newest version first met; a finding that only an older version had is still there. */
export function groupFindings(procedures: readonly PublishedProcedure[]): readonly FindingGroup[] {
  const groups = new Map<string, { title: string; findings: Map<string, string> }>();
  for (const { id, document } of [...procedures].sort((a, b) => b.version - a.version)) {
    const group = groups.get(id) ?? { title: document.title, findings: new Map<string, string>() };
    for (const step of document.steps) {
      if (step.kind === 'finding' && !group.findings.has(step.id)) group.findings.set(step.id, step.title);
    }
    groups.set(id, group);
  }
  return [...groups.values()]
    .map(({ title, findings }) => ({
      procedure: title,
      findings: [...findings].map(([id, title]) => ({ id, title })),
    }))
    .sort((a, b) => (a.procedure < b.procedure ? -1 : 1));
}
