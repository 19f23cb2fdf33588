import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { RunCommand } from '../../../../procedures/engine';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';

/** *Stop, supply off*: what makes the car safe, over the whole screen, and the two ways on, far from each other. */
@Component({
  selector: 'bay-stop-sheet',
  imports: [PrimaryButton],
  templateUrl: './stop-sheet.html',
  styleUrl: './takeover.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopSheet {
  readonly run = input.required<RunView>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();

  protected readonly acts = computed(() => this.run().procedure.document.stop.makeSafe);
  protected readonly disturbed = computed(() => this.run().state.disturbed);
  protected readonly number = computed(() => {
    const { procedure, state } = this.run();
    return state.current === undefined ? undefined : procedure.step(state.current.id)?.number;
  });
  protected readonly exit = computed(() => this.run().procedure.step(this.run().procedure.document.stop.exit.to));
}
