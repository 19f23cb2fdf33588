import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { expectedSteps } from '../../../../procedures/engine';
import type { RunView } from '../run-view';

/** What is always in sight: car and order, procedure and version, the place, what is disturbed, what is kept. */
@Component({
  selector: 'bay-run-header',
  templateUrl: './run-header.html',
  styleUrl: './run-header.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunHeaderBar {
  readonly run = input.required<RunView>();
  /** `Offline`, `Sent` or what else there is to say about the network. */
  readonly connection = input.required<string>();
  /** Events that wait to be sent. */
  readonly waiting = input(0);
  readonly openListAsked = output();
  readonly viewAsked = output();

  protected readonly isPractice = computed(() => this.run().header.kind === 'practice');
  protected readonly car = computed(() => this.run().state.visit);
  protected readonly half = computed(() => this.run().header.half);
  protected readonly version = computed(() => this.run().header.version);
  protected readonly title = computed(() => this.run().procedure.document.title);
  private readonly about = computed(() => expectedSteps(this.run().procedure));
  protected readonly place = computed(() => {
    const { procedure, state } = this.run();
    const step = state.current === undefined ? undefined : procedure.step(state.current.id);
    if (step !== undefined) return { before: 'Step ', number: step.number, about: this.about() };
    return {
      before: state.status === 'closed' || state.status === 'signed' ? 'Closed' : 'Finding',
      number: '',
      about: 0,
    };
  });
  protected readonly disturbed = computed(() => this.run().state.disturbed.length);
}
