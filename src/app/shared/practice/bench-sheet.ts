import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { shownUnit } from '../../../../procedures/engine/showing';
import { scenarioOfVisit } from './practice-scenarios';

/**
 * What the bench shows in a practice run at one step: figures of instruments, codes, what is seen and heard, in one
 * line. Where that line is too narrow, a tap lays all of it over what stands above. Renders nothing where the scenario
 * has nothing to show.
 */
@Component({
  selector: 'bay-bench-sheet',
  templateUrl: './bench-sheet.html',
  styleUrl: './bench-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchSheet {
  /** The run's header's visit. */
  readonly visitId = input.required<string>();
  /** The current step's id; absent between steps. */
  readonly stepId = input<string>();

  protected readonly unit = shownUnit;
  protected readonly entries = computed(() => {
    const step = this.stepId();
    return (step === undefined ? undefined : scenarioOfVisit(this.visitId())?.bench[step]) ?? [];
  });
  /** Whether all of it is laid open; another step closes it. */
  protected readonly isOpen = linkedSignal({ source: this.stepId, computation: () => false });

  protected toggle(): void {
    this.isOpen.update((isOpen) => !isOpen);
  }
}
