import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { RunCommand } from '../../../../procedures/engine/showing';
import { ReasonField } from '../../shared/reason-field';
import { entryField } from '../entry-draft';
import { RefusalLine } from '../frame/refusal-line';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';

/**
 * *Stop, supply off*: what makes the car safe, over the whole screen, and the two ways on, far from each other. Why it
 * was stopped is asked beside that, for the way out: to end the test it must be said, to go back it may be.
 */
@Component({
  selector: 'bay-stop-sheet',
  imports: [PrimaryButton, ReasonField, RefusalLine],
  templateUrl: './stop-sheet.html',
  styleUrls: ['./takeover.css', './stop-sheet.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopSheet {
  readonly run = input.required<RunView>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();

  protected readonly usuals = [
    'The supply or the plug does not hold',
    'A part moved or came loose',
    'Somebody came too near',
    'The car is needed elsewhere',
  ];
  protected readonly reason = entryField(this.run, 'stopped because', '', ['stopped', 'resumed']);
  protected readonly acts = computed(() => this.run().procedure.document.stop.makeSafe);
  protected readonly disturbed = computed(() => this.run().state.disturbed);
  protected readonly number = computed(() => {
    const { procedure, state } = this.run();
    return state.current === undefined ? undefined : procedure.step(state.current.id)?.number;
  });
  protected readonly exit = computed(() => this.run().procedure.step(this.run().procedure.document.stop.exit.to));
  /** What ending the test still waits for. */
  protected readonly missing = computed(() => {
    const isSaid = this.reason().trim() !== '' || (this.run().state.pause?.reason ?? '') !== '';
    return isSaid ? undefined : 'To end as not completed, say why.';
  });

  protected leave(how: 'go-back' | 'not-completed'): void {
    this.commanded.emit({ do: 'leave-stop', how, reason: this.reason().trim() });
  }
}
