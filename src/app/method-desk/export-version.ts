import { DOCUMENT, inject, Injectable } from '@angular/core';
import type { ProcedureDocument } from '../../../procedures/document';
import { OfflineStore } from '../core/offline-store';

/** Gives a published version out as a file, exactly as it was published. */
@Injectable({ providedIn: 'root' })
export class VersionExporter {
  private readonly offline = inject(OfflineStore);
  private readonly document = inject(DOCUMENT);

  /** Whether the version was on this device and went out as a file. */
  async export(procedureId: string, version: number): Promise<boolean> {
    const published = await this.offline.procedures.get([procedureId, version]);
    if (published === undefined) return false;
    const url = URL.createObjectURL(new Blob([fileText(published.document)], { type: 'application/json' }));
    const link = this.document.createElement('a');
    link.href = url;
    link.download = `${procedureId}-version-${version}.json`;
    link.click();
    // The browser has taken the bytes once the click's own task is over.
    setTimeout(() => URL.revokeObjectURL(url));
    return true;
  }
}

/** The document as a file for people and their tools: two blanks a level, a line end at its end. */
export function fileText(document: ProcedureDocument): string {
  return `${JSON.stringify(document, null, 2)}\n`;
}
