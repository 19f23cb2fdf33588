import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  untracked,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { LoadProblem } from '../shared/load-problem';
import { TopBar } from '../shared/top-bar';
import { Outline } from './outline';
import { ProcedureHead } from './procedure-head';
import { ReadingStore } from './reading-store';
import { StepReading } from './step-reading';

/** A draft or a version, to be read step by step: the outline on one side, the step with its ways on beside it. */
@Component({
  selector: 'bay-reading-page',
  imports: [LoadProblem, Outline, ProcedureHead, RouterLink, StepReading, TopBar],
  templateUrl: './reading-page.html',
  styleUrl: './reading-page.css',
  providers: [ReadingStore],
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingPage {
  protected readonly store = inject(ReadingStore);

  /** Of the address: either a draft's id, or a procedure's with its version. */
  readonly draftId = input<string>();
  readonly procedureId = input<string>();
  readonly version = input<string>();

  /** The id of the step that is read; empty for what stands before the steps, where another document begins. */
  protected readonly selected = linkedSignal({ source: () => this.store.document(), computation: () => '' });
  protected readonly step = computed(() => this.store.document()?.steps.find(({ id }) => id === this.selected()));
  protected readonly stepProblems = computed(() =>
    this.store.problems().filter(({ step }) => step !== undefined && step === this.selected()),
  );
  protected readonly stepWarnings = computed(
    () => this.store.report()?.warnings.filter(({ step }) => step !== undefined && step === this.selected()) ?? [],
  );
  /** Problems of the document as a whole. */
  protected readonly ownProblems = computed(() => this.store.problems().filter(({ step }) => step === undefined));
  protected readonly counts = computed(() => {
    const steps = this.store.document()?.steps ?? [];
    const findings = steps.filter(({ kind }) => kind === 'finding').length;
    return `${steps.length - findings} steps, ${findings} findings`;
  });

  constructor() {
    // The store lives outside the template: it follows the address.
    effect(() => {
      const draftId = this.draftId();
      const procedureId = this.procedureId();
      const version = Number(this.version());
      untracked(() => {
        if (draftId !== undefined) this.store.readDraft(draftId);
        else if (procedureId !== undefined) void this.store.readVersion(procedureId, version);
      });
    });
  }

  protected read(stepId: string): void {
    this.selected.set(stepId);
    document.getElementById(`outline-${stepId}`)?.scrollIntoView({ block: 'nearest' });
  }
}
