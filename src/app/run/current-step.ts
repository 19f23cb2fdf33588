import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Step } from '../../../procedures/document';
import type { RunCommand, Series } from '../../../procedures/engine/showing';
import type { GearItem } from '../core/wire';
import { CautionGate } from './frame/caution-gate';
import { HandSide } from './frame/hand-side';
import { WideSide } from './frame/wide-side';
import type { ClocksNow } from './hold-clock';
import { LaterStep } from './later';
import type { ListenDone, SeriesTaken } from './listen/listen-requests';
import type { PhotoTaken } from './photo/photo-file';
import type { RunProblem, RunView } from './run-view';
import { StartEntry } from './start/start-entry';
import { cautionToRead } from './step-cautions';

/** The current step: its cautions first, then the entry of its kind. */
@Component({
  selector: 'bay-current-step',
  imports: [CautionGate, HandSide, LaterStep, StartEntry, WideSide],
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
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly seriesTaken = output<SeriesTaken>();
  readonly finished = output<ListenDone>();
  readonly photoTaken = output<PhotoTaken>();
  readonly wouldGoTo = output<string | undefined>();
  readonly holdOver = output();
  readonly leftForBench = output();

  /** The caution that has to be acknowledged before the step's entry unlocks. */
  protected readonly caution = computed(() => {
    const step = this.step();
    if (step.kind === 'start' || step.kind === 'finding') return undefined;
    const at = cautionToRead(this.run(), step);
    return at === undefined ? undefined : { at };
  });
  /** Whether it is a start card that nobody else has a part in. */
  protected readonly isOwnStart = computed(() => {
    const { kind, release, verify } = this.step();
    return kind === 'start' && release === undefined && verify === undefined;
  });
}
