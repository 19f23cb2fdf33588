import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { RunCommand } from '../../../../procedures/engine/showing';
import { clockTime } from '../../core/time-words';
import { ResultMark } from '../../shared/result-mark';
import { resultWords } from '../../shared/result-words';
import { entryField } from '../entry-draft';
import { RefusalLine } from '../frame/refusal-line';
import { PrimaryButton } from '../primary-action';
import { JudgedLine } from '../readings/judged-line';
import type { RunProblem, RunView } from '../run-view';
import { beadResult, walkedBefore } from '../walked-steps';
import { ReasonField } from '../../shared/reason-field';
import { recordedIn } from './recorded-in-step';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';
import { SheetWide } from './sheet-wide';

/** An earlier step as it was left: nothing can be entered, and one control leads back. */
@Component({
  selector: 'bay-look-back-sheet',
  imports: [JudgedLine, PrimaryButton, ReasonField, RefusalLine, ResultMark, SheetBody, SheetHand, SheetWide],
  templateUrl: './look-back-sheet.html',
  styleUrl: './look-back-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LookBackSheet {
  readonly run = input.required<RunView>();
  /** Which of the walked beads. */
  readonly bead = input.required<number>();
  readonly moved = output<number>();
  readonly left = output();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();

  protected readonly isRedoing = signal(false);
  protected readonly reason = entryField(this.run, () => `again ${this.place()?.step.id ?? ''}`, '');
  /** What was missing at the last tap on *Take it again*, and is missing still. */
  protected readonly missing = computed(() =>
    this.wasTried() && this.reason().trim() === '' ? 'Say why first.' : undefined,
  );
  private readonly wasTried = signal(false);

  private readonly places = computed(() => walkedBefore(this.run()));
  protected readonly place = computed(() => this.places()[this.bead()]);
  protected readonly isFirst = computed(() => this.bead() <= 0);
  protected readonly isNewest = computed(() => this.bead() >= this.places().length - 1);
  protected readonly result = computed(() => {
    const place = this.place();
    return place === undefined ? 'done' : beadResult(place.walked);
  });
  protected readonly resultWords = resultWords;
  protected readonly time = computed(() => {
    const walked = this.place()?.walked;
    return walked === undefined ? '' : clockTime(walked.doneAt ?? walked.claimedAt);
  });
  protected readonly recorded = computed(() => {
    const place = this.place();
    return place === undefined ? { values: [], lines: [] } : recordedIn(this.run(), place);
  });
  protected readonly here = computed(() => {
    const { procedure, state } = this.run();
    return state.current === undefined ? undefined : procedure.step(state.current.id)?.number;
  });

  protected redo(step: string): void {
    this.wasTried.set(true);
    const reason = this.reason().trim();
    if (reason !== '') this.commanded.emit({ do: 'redo', step, reason });
  }
}
