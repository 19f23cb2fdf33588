import { Dialog } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { clock } from '../core/time-and-ids';
import { dayTime } from '../core/time-words';
import { LoadProblem } from '../shared/load-problem';
import { TopBar } from '../shared/top-bar';
import { VersionExporter } from './export-version';
import { ImportPanel, type ChosenFile } from './import-panel';
import { MethodDeskStore } from './method-desk-store';
import type { DraftSummary, ProcedureSummary } from './method-wire';
import { ProcedureVersions } from './procedure-versions';
import { PublishDialog, type PublishQuestion } from './publish-dialog';
import { ReplaceDraftDialog, type ReplaceDraftQuestion } from './replace-draft-dialog';
import { WithdrawDialog, type WithdrawQuestion } from './withdraw-dialog';

/** The Method desk: every procedure with its versions, and the way from a file to a published version. */
@Component({
  selector: 'bay-method-desk-page',
  imports: [ImportPanel, LoadProblem, ProcedureVersions, TopBar],
  templateUrl: './method-desk-page.html',
  styleUrl: './method-desk-page.css',
  providers: [MethodDeskStore],
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MethodDeskPage {
  protected readonly store = inject(MethodDeskStore);
  private readonly exporter = inject(VersionExporter);
  private readonly dialog = inject(Dialog);

  protected readonly now = inject(clock)();

  constructor() {
    void this.store.recall();
  }

  protected async bringIn({ fileName, text }: ChosenFile): Promise<void> {
    const same = this.store.sameAs(text);
    if (same !== undefined) return this.store.leaveAsItIs(fileName, same);
    const waiting = this.store.draftInPlaceOf(text);
    if (waiting === undefined || (await this.mayReplace(waiting, fileName))) {
      return this.store.bringIn(fileName, text);
    }
    this.store.say({ tone: 'done', text: `${fileName} was not brought in. The earlier draft stays as it is.` });
  }

  /** Tries the kept file again, as it is. */
  protected async tryAgain(): Promise<void> {
    const kept = this.store.unfinished();
    if (kept !== undefined) await this.bringIn(kept);
  }

  protected async publish({ versions }: ProcedureSummary, draft: DraftSummary): Promise<void> {
    const version = versions.reduce((highest, entry) => Math.max(highest, entry.version), 0) + 1;
    const { title } = draft;
    const data: PublishQuestion = { title, version };
    const opened = this.dialog.open<boolean>(PublishDialog, { data, ariaLabelledBy: 'publish-title' });
    if ((await firstValueFrom(opened.closed)) === true) await this.store.publish(draft.id, title);
  }

  protected async withdraw({ id, title }: ProcedureSummary, version: number): Promise<void> {
    const data: WithdrawQuestion = { title, version };
    const opened = this.dialog.open<string>(WithdrawDialog, { data, ariaLabelledBy: 'withdraw-title' });
    const reason = await firstValueFrom(opened.closed);
    if (reason !== undefined) await this.store.withdraw(id, version, reason);
  }

  protected async export({ id }: ProcedureSummary, version: number): Promise<void> {
    if (await this.exporter.export(id, version)) return;
    this.store.say({
      tone: 'failed',
      text: `Version ${version} is not on this device yet; it comes with the next sync.`,
    });
  }

  protected reportUnreadable(fileName: string): void {
    this.store.say({
      tone: 'failed',
      text: `${fileName} could not be read: it was moved or changed. Choose it again.`,
    });
  }

  private async mayReplace({ title, importedAt, importedBy }: DraftSummary, fileName: string): Promise<boolean> {
    const data: ReplaceDraftQuestion = { title, when: dayTime(Date.parse(importedAt), this.now), importedBy, fileName };
    const opened = this.dialog.open<boolean>(ReplaceDraftDialog, { data, ariaLabelledBy: 'replace-draft-title' });
    return (await firstValueFrom(opened.closed)) === true;
  }
}
