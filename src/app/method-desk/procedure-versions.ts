import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import { dayTime } from '../core/time-words';
import type { DraftSummary, ProcedureSummary } from './method-wire';

/** A procedure with its draft on top and its versions below, newest first. */
@Component({
  selector: 'bay-procedure-versions',
  imports: [RouterLink],
  templateUrl: './procedure-versions.html',
  styleUrl: './procedure-versions.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureVersions {
  readonly procedure = input.required<ProcedureSummary>();
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();
  readonly isBusy = input(false);

  readonly publish = output<DraftSummary>();
  readonly withdraw = output<number>();
  readonly export = output<number>();

  protected readonly draft = computed(() => {
    const { draft } = this.procedure();
    if (draft == null) return undefined;
    return { summary: draft, problems: draft.problems.length, when: this.said(draft.importedAt) };
  });
  /** What the title is of, where it is not a published version's. */
  protected readonly headedBy = computed(() => {
    const { versions, draft } = this.procedure();
    if (versions.some(({ status }) => status === 'published')) return undefined;
    return draft == null ? 'withdrawn' : 'draft';
  });
  protected readonly nextVersion = computed(
    () => this.procedure().versions.reduce((highest, { version }) => Math.max(highest, version), 0) + 1,
  );
  protected readonly versions = computed(() => {
    const newest = this.procedure().versions.find(({ status }) => status === 'published')?.version;
    return this.procedure().versions.map((entry) => ({
      ...entry,
      when: this.said(entry.publishedAt),
      withdrawn: entry.withdrawal && {
        reason: entry.withdrawal.reason,
        when: `withdrawn ${this.said(entry.withdrawal.at)}, ${entry.withdrawal.by}`,
      },
      shortHash: entry.contentHash.slice(0, 10),
      isInUse: entry.version === newest,
    }));
  });

  private said(moment: string): string {
    return dayTime(Date.parse(moment), this.now());
  }
}
