import { computed, inject, Injectable, signal } from '@angular/core';
import type { ProcedureDocument } from '../../../procedures/document';
import { contentHash } from '../../../procedures/engine/showing';
import { ApiProblem } from '../core/api-problem';
import { Sync } from '../core/sync';
import { problemsOf } from './import-problems';
import { ImportKeeper, type KeptImport } from './kept-import';
import { MethodShelf, procedureListResource } from './method-shelf';
import type { DraftSummary } from './method-wire';
import { readProcedureFile } from './read-procedure-file';

/** What was last done, for the person to see. */
export interface DeskNotice {
  readonly tone: 'done' | 'unfinished' | 'failed';
  readonly text: string;
}

/** The Method desk's list, and the file that is being brought in. */
@Injectable()
export class MethodDeskStore {
  private readonly shelf = inject(MethodShelf);
  private readonly keeper = inject(ImportKeeper);
  private readonly sync = inject(Sync);

  private readonly list = procedureListResource();
  private readonly kept = signal<KeptImport | undefined>(undefined);
  private readonly said = signal<DeskNotice | undefined>(undefined);
  private readonly working = signal(false);

  /** Undefined until the server has answered; the earlier answer stands while it is asked again. */
  readonly procedures = computed(() => (this.list.hasValue() ? this.list.value() : undefined));
  readonly problem = computed(() => this.list.error());
  /** The file that could not become a draft; undefined when there is none. */
  readonly unfinished = this.kept.asReadonly();
  readonly notice = this.said.asReadonly();
  /** Whether something is under way that must not be started twice. */
  readonly isBusy = this.working.asReadonly();

  /** Finds the file that an earlier visit left unfinished. */
  async recall(): Promise<void> {
    this.kept.set(await this.keeper.read());
  }

  again(): void {
    this.list.reload();
  }

  /** Brings a file in. What cannot become a draft is kept with its problems. */
  async bringIn(fileName: string, text: string): Promise<void> {
    const read = readProcedureFile(text);
    if (!read.ok) return this.keep({ fileName, text, problems: [read.problem], isWaiting: false });
    await this.during(async () => {
      let problems = 0;
      try {
        problems = (await this.shelf.importDraft(read.document)).problems.length;
      } catch (error) {
        if (!(error instanceof ApiProblem)) throw error;
        // Someone else brought in or published the same meanwhile.
        if (error.status === 409) return this.sayTheSame(error.message);
        return this.keep(refusedImport({ fileName, text }, read.document, error));
      }
      await this.putAway();
      this.said.set({
        tone: problems === 0 ? 'done' : 'unfinished',
        text: `${fileName} is a draft now. ${publishingWords(problems)}`,
      });
      this.list.reload();
    });
  }

  /** What stands already and says exactly what a file says, in words; by the list as it was last fetched. */
  sameAs(text: string): string | undefined {
    const read = readProcedureFile(text);
    if (!read.ok || !('id' in read.document)) return undefined;
    const { id } = read.document;
    const listed = this.procedures()?.find((procedure) => procedure.id === id);
    const hash = hashOf(read.document);
    const standing = listed?.versions.find(({ status }) => status === 'published');
    if (standing !== undefined && standing.contentHash === hash) return `Version ${standing.version}`;
    return listed?.draft != null && listed.draft.contentHash === hash ? 'The draft that waits' : undefined;
  }

  /** Lets a file go that says what stands already. */
  async leaveAsItIs(fileName: string, same: string): Promise<void> {
    await this.putAway();
    this.said.set({ tone: 'done', text: `${same} says exactly what ${fileName} says: nothing was changed.` });
  }

  /** The draft whose place a file would take, by the list as it was last fetched. */
  draftInPlaceOf(text: string): DraftSummary | undefined {
    const read = readProcedureFile(text);
    if (!read.ok || !('id' in read.document)) return undefined;
    const { id } = read.document;
    return this.procedures()?.find((procedure) => procedure.id === id)?.draft ?? undefined;
  }

  /** Lets go of the kept file. */
  async putAway(): Promise<void> {
    await this.keeper.putAway();
    this.kept.set(undefined);
  }

  /** Publishes a draft; tells the tablets soon. */
  publish(draftId: string, title: string): Promise<void> {
    return this.change(async () => {
      const { version } = await this.shelf.publish(draftId);
      return `${title} is published as version ${version}.`;
    });
  }

  /** Withdraws a version with a reason. */
  withdraw(procedureId: string, version: number, reason: string): Promise<void> {
    return this.change(async () => {
      await this.shelf.withdraw(procedureId, version, reason);
      return `Version ${version} is withdrawn. No new run starts on it.`;
    });
  }

  /** Says something that was found out elsewhere on the page. */
  say(notice: DeskNotice): void {
    this.said.set(notice);
  }

  private async sayTheSame(text: string): Promise<void> {
    await this.putAway();
    this.said.set({ tone: 'done', text });
    this.list.reload();
  }

  private async change(act: () => Promise<string>): Promise<void> {
    await this.during(async () => {
      try {
        this.said.set({ tone: 'done', text: await act() });
        this.list.reload();
        this.sync.soon();
      } catch (error) {
        if (!(error instanceof ApiProblem)) throw error;
        const text = error.isUnavailable ? 'No network: nothing was changed. Try again with one.' : error.message;
        this.said.set({ tone: 'failed', text });
      }
    });
  }

  private async keep(kept: KeptImport): Promise<void> {
    this.kept.set(kept);
    await this.keeper.keep(kept);
  }

  private async during(work: () => Promise<void>): Promise<void> {
    if (this.working()) return;
    this.working.set(true);
    this.said.set(undefined);
    await work().finally(() => this.working.set(false));
  }
}

/** Undefined for what has no canonical form, as a lone half of a surrogate pair: the server says what is wrong with it. */
function hashOf(document: object): string | undefined {
  try {
    return contentHash(document as ProcedureDocument);
  } catch (error) {
    if (error instanceof Error) return undefined;
    throw error;
  }
}

function publishingWords(problems: number): string {
  if (problems === 0) return 'Nothing keeps it from being published.';
  return `${problems === 1 ? '1 problem keeps' : `${problems} problems keep`} it from being published: read it to see which.`;
}

function refusedImport(file: Pick<KeptImport, 'fileName' | 'text'>, document: object, refusal: ApiProblem): KeptImport {
  const isWaiting = refusal.isUnavailable;
  return { ...file, problems: isWaiting ? [] : problemsOf(refusal, document), isWaiting };
}
