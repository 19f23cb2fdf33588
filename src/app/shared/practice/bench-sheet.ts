import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit } from '../../../../procedures/engine';
import { scenarioOfVisit } from './practice-scenarios';

/**
 * What the bench shows in a practice run at one step: figures of instruments, codes, what is seen and heard. Renders
 * nothing where the scenario has nothing to show there.
 */
@Component({
  selector: 'bay-bench-sheet',
  template: `
    @if (entries().length > 0) {
      <section aria-label="What the bench shows">
        <b>The bench shows</b>
        <ul>
          @for (entry of entries(); track $index) {
            @switch (entry.what) {
              @case ('figure') {
                <li>
                  {{ entry.label }} <span class="num">{{ entry.text }} {{ unit(entry.unit) }}</span>
                </li>
              }
              @case ('codes') {
                @for (code of entry.codes; track code.code) {
                  <li>
                    <span class="num">{{ code.code }}</span> {{ code.status }}
                    @if (code.freezeFrame) {
                      <span class="muted">{{ code.freezeFrame }}</span>
                    }
                  </li>
                }
              }
              @case ('seen') {
                <li>{{ entry.text }}</li>
              }
            }
          }
        </ul>
      </section>
    }
  `,
  styles: `
    section {
      display: grid;
      gap: 4px;
      padding: 8px 14px;
      border: 2px dashed var(--edge);
      border-radius: var(--r);
      background: var(--shade);
      color: var(--ink);
    }
    ul {
      list-style: none;
      display: flex;
      flex-wrap: wrap;
      gap: 2px 22px;
    }
  `,
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
}
