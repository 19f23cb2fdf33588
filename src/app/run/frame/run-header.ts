import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { expectedSteps } from '../../../../procedures/engine/showing';
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
  /** Where sending stands, in two or three words. */
  readonly connection = input.required<string>();
  readonly openListAsked = output();
  readonly viewAsked = output();

  protected readonly isPractice = computed(() => this.run().header.kind === 'practice');
  protected readonly car = computed(() => this.run().state.visit);
  protected readonly title = computed(() => this.run().procedure.document.title);
  /** Before the title, which may be cut at its end. */
  protected readonly version = computed(() => {
    const { half, version } = this.run().header;
    return half === undefined ? `Version ${version}` : `${half === 'cold' ? 'Cold' : 'Warm'} half, version ${version}`;
  });
  private readonly expected = computed(() => expectedSteps(this.run().procedure, this.run().state.header.half));
  protected readonly place = computed(() => {
    const { procedure, state } = this.run();
    const step = state.current === undefined ? undefined : procedure.step(state.current.id);
    if (step === undefined) {
      const isClosed = state.status === 'closed' || state.status === 'signed';
      const words = isClosed ? 'Closed' : 'Finding';
      return { words, briefly: words };
    }
    const expected = this.expected();
    return { words: `Step ${step.number} of about ${expected}`, briefly: `Step ${step.number} of ${expected}` };
  });
  /** The person stays at the car: what can wait, such as what is sent, is not said meanwhile. */
  protected readonly isStaying = computed(() => {
    const { procedure, state } = this.run();
    return state.current !== undefined && procedure.step(state.current.id)?.stay === true;
  });
  protected readonly disturbed = computed(() => this.run().state.disturbed.length);
}
