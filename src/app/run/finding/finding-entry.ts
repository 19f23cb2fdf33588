import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { renderTemplate } from '../../../../procedures/engine/showing';
import { evidenceOf } from '../../../../procedures/engine/evidence';
import { ResultMark } from '../../shared/result-mark';
import { resultWords } from '../../shared/result-words';
import { BigAction } from '../frame/big-action';
import { unbroken } from '../../shared/unbroken';
import { HandSide } from '../frame/hand-side';
import { PrimaryButton } from '../primary-action';
import { JudgedLine } from '../readings/judged-line';
import { SheetWide } from '../sheets/sheet-wide';
import { StepEntry } from '../step-entry';
import { RestoreList } from '../steps/restore-list';
import { draftOf, editsIn, isKept, partWords, type WriteUpEdits, type WriteUpPartName } from './write-up-draft';

type Stage = 'write-up' | 'close';

/**
 * The end of a path: the verdict and its numbers, the write-up to be read and mended, and then, apart, the closing with
 * what is still open read back.
 */
@Component({
  selector: 'bay-finding-entry',
  imports: [BigAction, HandSide, JudgedLine, PrimaryButton, RestoreList, ResultMark, SheetWide],
  templateUrl: './finding-entry.html',
  styleUrl: './finding-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingEntry extends StepEntry<'finding'> {
  /** What was edited before a reload. */
  readonly draft = input<unknown>();
  /** What is edited now. */
  readonly drafted = output<WriteUpEdits>();
  readonly leftForBench = output();

  protected readonly words = partWords;
  protected readonly stage = signal<Stage>('write-up');
  protected readonly editing = signal<WriteUpPartName | undefined>(undefined);
  private readonly edits = computed<WriteUpEdits>(() => editsIn(this.draft()));

  protected readonly verdict = computed(() => {
    const { procedure, state } = this.run();
    return unbroken(renderTemplate(procedure, state, this.step().verdict) ?? this.step().title);
  });
  /** What led to the finding, and what else was judged. */
  protected readonly evidence = computed(() => {
    const { procedure, state, events } = this.run();
    return evidenceOf(procedure, state, events);
  });
  /** `6 more readings, 1 of them out of band`: what is folded away does not hide that something is off. */
  protected readonly restWords = computed(() => {
    const { rest } = this.evidence();
    const off = rest.filter(({ judgement }) => judgement?.result === 'out').length;
    const all = `${rest.length} more ${rest.length === 1 ? 'reading' : 'readings'}`;
    return off === 0 ? all : `${all}, ${off} of them ${resultWords.out}`;
  });
  protected readonly parts = computed(() => draftOf(this.run(), this.edits()));
  protected readonly edited = computed(() => this.parts().find(({ name }) => name === this.editing()));
  protected readonly isKept = computed(() => isKept(this.run(), this.parts()));
  protected readonly disturbed = computed(() => this.run().state.disturbed);
  protected readonly isPractice = computed(() => this.run().header.kind === 'practice');
  protected readonly isClosed = computed(() => ['closed', 'signed'].includes(this.run().state.status));
  /** What is read back before the run is closed. */
  protected readonly readBack = computed(() => {
    const { state, events } = this.run();
    const count = (type: string): number => events.filter((event) => event.type === type).length;
    const notMeasured = state.walked.filter((walked) => walked.notMeasured === true && walked.isLeft !== true).length;
    return [
      { what: 'Still disturbed', count: state.disturbed.length },
      { what: 'Steps not measured', count: notMeasured },
      { what: 'Ways overruled', count: count('branch-overruled') },
      { what: 'Limits exceeded', count: count('limit-exceeded') },
    ];
  });

  protected edit(name: WriteUpPartName, text: string): void {
    this.drafted.emit({ ...this.edits(), [name]: text });
  }

  protected restoreComposed(name: WriteUpPartName, composed: string): void {
    this.edit(name, composed);
  }

  protected keep(): void {
    const text = (name: WriteUpPartName): string => this.parts().find((part) => part.name === name)?.text ?? '';
    this.commanded.emit({
      do: 'keep-write-up',
      concern: text('concern'),
      cause: text('cause'),
      correction: text('correction'),
      customer: text('customer'),
    });
  }
}
