import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Step } from '../../../procedures/document';
import type { RunCommand, Series } from '../../../procedures/engine';
import type { GearItem } from '../core/wire';
import { CodesEntry } from './codes/codes-entry';
import { entryField } from './entry-draft';
import { FindingEntry } from './finding/finding-entry';
import { CautionGate } from './frame/caution-gate';
import { HandSide } from './frame/hand-side';
import { WideSide } from './frame/wide-side';
import type { ClocksNow } from './hold-clock';
import { ListenEntry } from './listen/listen-entry';
import type { ListenDone, SeriesTaken } from './listen/listen-requests';
import { ReadingEntry } from './readings/reading-entry';
import type { RunProblem, RunView } from './run-view';
import { StartEntry } from './start/start-entry';
import { cautionToRead } from './step-cautions';
import { ActionEntry } from './steps/action-entry';
import { ChoiceEntry } from './steps/choice-entry';
import { ComputeEntry } from './steps/compute-entry';
import { DriveEntry } from './steps/drive-entry';
import { HoldEntry } from './steps/hold-entry';
import { RestoreEntry } from './steps/restore-entry';

/** The current step: its cautions first, then the entry of its kind. */
@Component({
  selector: 'bay-current-step',
  imports: [
    ActionEntry,
    CautionGate,
    ChoiceEntry,
    CodesEntry,
    ComputeEntry,
    DriveEntry,
    FindingEntry,
    HandSide,
    HoldEntry,
    ListenEntry,
    ReadingEntry,
    RestoreEntry,
    StartEntry,
    WideSide,
  ],
  templateUrl: './current-step.html',
  styles: ':host { display: contents }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CurrentStepView {
  readonly run = input.required<RunView>();
  readonly step = input.required<Step>();
  /** The site's instruments. */
  readonly gear = input.required<readonly GearItem[]>();
  /** The device's clock. */
  readonly now = input.required<number>();
  /** Reads the run's clocks. */
  readonly clocks = input.required<() => ClocksNow>();
  /** The listen step's kept series, once its bytes are read. */
  readonly kept = input<Series>();
  /** A log that the practice bench offers. */
  readonly offered = input<{ readonly fileName: string; readonly path: string }>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly seriesTaken = output<SeriesTaken>();
  readonly finished = output<ListenDone>();
  readonly wouldGoTo = output<string | undefined>();
  readonly holdOver = output();
  readonly leftForBench = output();

  /** What is edited in the write-up and not kept yet. */
  protected readonly writeUp = entryField<object>(this.run, 'write-up', {});
  /** The caution that has to be acknowledged before the step's entry unlocks. */
  protected readonly caution = computed(() => {
    const step = this.step();
    if (step.kind === 'start' || step.kind === 'finding') return undefined;
    const at = cautionToRead(this.run(), step);
    return at === undefined ? undefined : { at };
  });
  protected readonly elapsed = () => this.clocks()().elapsed;
}
