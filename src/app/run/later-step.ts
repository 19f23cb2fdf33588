import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { Step } from '../../../procedures/document';
import type { RunCommand, Series } from '../../../procedures/engine/showing';
import type { GearItem } from '../core/wire';
import { CodesEntry } from './codes/codes-entry';
import { entryField } from './entry-draft';
import { FindingEntry } from './finding/finding-entry';
import type { ClocksNow } from './hold-clock';
import { ListenEntry } from './listen/listen-entry';
import type { ListenDone, SeriesTaken } from './listen/listen-requests';
import { KeptPhotos } from './photo/kept-photos';
import { PhotoEntry } from './photo/photo-entry';
import type { PhotoTaken } from './photo/photo-file';
import { ReadingEntry } from './readings/reading-entry';
import { RunPeople } from './run-people';
import type { RunProblem, RunView } from './run-view';
import { StartEntry } from './start/start-entry';
import { SecondPersonEntry } from './second-person/second-person-entry';
import { isForSomebody } from './second-person/waiting-for';
import { ActionEntry } from './steps/action-entry';
import { CallEntry } from './steps/call-entry';
import { ChoiceEntry } from './steps/choice-entry';
import { ComputeEntry } from './steps/compute-entry';
import { DriveEntry } from './steps/drive-entry';
import { HoldEntry } from './steps/hold-entry';
import { RestoreEntry } from './steps/restore-entry';
import { timedStage } from './timed-stage';

/** The entry of any step but a start card of one's own. Apart from it, so that the first one need not wait for all the others. */
@Component({
  selector: 'bay-later-step',
  imports: [
    ActionEntry,
    CallEntry,
    ChoiceEntry,
    CodesEntry,
    ComputeEntry,
    DriveEntry,
    FindingEntry,
    HoldEntry,
    ListenEntry,
    PhotoEntry,
    ReadingEntry,
    RestoreEntry,
    SecondPersonEntry,
    StartEntry,
  ],
  // What the first step has no use for is brought with the others.
  providers: [KeptPhotos, RunPeople],
  templateUrl: './later-step.html',
  styles: ':host { display: contents }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaterStep {
  protected readonly photos = inject(KeptPhotos);
  protected readonly people = inject(RunPeople);

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
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly seriesTaken = output<SeriesTaken>();
  readonly finished = output<ListenDone>();
  readonly photoTaken = output<PhotoTaken>();
  readonly wouldGoTo = output<string | undefined>();
  readonly holdOver = output();
  readonly leftForBench = output();

  /** What is edited in the write-up and not kept yet. */
  protected readonly writeUp = entryField<object>(this.run, 'write-up', {});
  /** Whether only somebody else's part of the step, or the way on after it, is left. */
  protected readonly isForSomebody = computed(() => isForSomebody(this.run(), this.step()));
  /** What a timed step asks for now. */
  protected readonly stage = computed(() => {
    const step = this.step();
    return step.kind === 'hold' || step.kind === 'wait' ? timedStage(this.run(), step) : undefined;
  });
  protected readonly elapsed = () => this.clocks()().elapsed;
}
