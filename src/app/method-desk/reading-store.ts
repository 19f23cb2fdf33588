import { computed, inject, Injectable, resource, signal } from '@angular/core';
import type { ProcedureDocument } from '../../../procedures/document';
import { pictureParts } from '../../../procedures/library/picture-parts';
import { OfflineStore } from '../core/offline-store';
import type { PublishedProcedure } from '../core/wire';
import { draftResource } from './method-shelf';
import type { FileProblem } from './read-procedure-file';

/** The version is not on this device. */
export class VersionNotHere extends Error {
  override readonly name = 'VersionNotHere';
}

/** A draft from the server, or a version from this device, with what this build finds wrong in it. */
@Injectable()
export class ReadingStore {
  private readonly offline = inject(OfflineStore);

  private readonly draftId = signal<string | undefined>(undefined);
  private readonly version = signal<PublishedProcedure | undefined>(undefined);
  private readonly versionProblem = signal<Error | undefined>(undefined);

  private readonly draft = draftResource(this.draftId);
  private readonly checked = resource({ params: () => this.document(), loader: ({ params }) => check(params) });

  readonly document = computed<ProcedureDocument | undefined>(
    () => this.version()?.document ?? (this.draft.hasValue() ? this.draft.value()?.document : undefined),
  );
  readonly title = computed(() => {
    const title = this.document()?.title;
    if (title === undefined) return undefined;
    const version = this.version();
    if (version === undefined) return `${title}, draft`;
    return `${title}, version ${version.version}${version.status === 'withdrawn' ? ', withdrawn' : ''}`;
  });
  /** What is read, for the words of a failure. */
  readonly what = computed(() =>
    this.draftId() === undefined ? 'The steps of this version' : 'The steps of this draft',
  );
  readonly problem = computed(() => this.draft.error() ?? this.versionProblem());
  /** What the lint says; undefined until it has looked. */
  readonly report = computed(() => (this.checked.hasValue() ? this.checked.value() : undefined));
  /** What must be mended before it can be published. */
  readonly problems = computed(() => this.report()?.problems ?? []);
  readonly problemCounts = computed(() => {
    const counts = new Map<string, number>();
    for (const { step } of this.problems()) if (step !== undefined) counts.set(step, (counts.get(step) ?? 0) + 1);
    return counts;
  });

  readDraft(draftId: string): void {
    this.draftId.set(draftId);
  }

  async readVersion(procedureId: string, version: number): Promise<void> {
    const found = await this.offline.procedures.get([procedureId, version]);
    this.version.set(found);
    const missing = `Version ${version} of ${procedureId} is not on this device yet; it comes with the next sync.`;
    this.versionProblem.set(found === undefined ? new VersionNotHere(missing) : undefined);
  }

  again(): void {
    this.draft.reload();
  }
}

/** What the lint says of a document. */
export interface ReadingReport {
  /** What must be mended before it can be published. */
  readonly problems: readonly FileProblem[];
  /** What the author should think about. */
  readonly warnings: readonly FileProblem[];
  /** Finding's id -> the ids of the steps on one shortest way to it. */
  readonly ways: Readonly<Record<string, readonly string[]>>;
  /** Whether everything that a step opens is closed again on every way. */
  readonly isAllRestored: boolean;
}

/** Looks at a document as its publisher would; the reader of expressions and the lint come lazily. */
async function check(document: ProcedureDocument): Promise<ReadingReport> {
  const { lintProcedure } = await import('../../../procedures/document/authoring');
  const { errors, warnings, waysToFindings } = lintProcedure(document, { parts: pictureParts });
  const inWords = ({ step, pointer, message }: (typeof errors)[number]): FileProblem => ({
    where: pointer ?? 'the document',
    message,
    ...(step === undefined ? {} : { step }),
  });
  return {
    problems: errors.map(inWords),
    warnings: warnings.map(inWords),
    ways: waysToFindings,
    isAllRestored: errors.every(({ rule }) => rule !== 'restored'),
  };
}
