import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { shownUnit, type LimitAlarm, type RunCommand } from '../../../../procedures/engine/showing';
import { PrimaryButton } from '../primary-action';
import { shownFigure } from '../readings/number-text';
import type { RunProblem, RunView } from '../run-view';

/** A limit was exceeded: it takes the whole screen, says what to do, and goes by the hand alone, never by the pedal. */
@Component({
  selector: 'bay-limit-takeover',
  imports: [PrimaryButton],
  template: `
    <section class="takeover" role="alertdialog" aria-labelledby="limit-title">
      <div class="said">
        <h1 id="limit-title">Limit exceeded</h1>
        <p class="figure">
          <b class="num">{{ text() }}</b><span>{{ unit() }}</span>
        </p>
        <p class="then">{{ alarm().then }}</p>
        <p class="says">{{ alarm().says }}</p>
        @if (isStopped()) {
          <p class="says" role="status">Stopped. What makes the car safe comes next.</p>
        }
        @if (problem(); as problem) {
          <p class="error" role="alert">{{ problem.message }}</p>
        }
      </div>
      <div class="ends">
        <button
          type="button"
          bayPrimary="hand-only"
          class="knows"
          [disabled]="isBusy()"
          (click)="commanded.emit({ do: 'acknowledge-limit' })"
        >
          {{ done() }}
        </button>
        @if (!isStopped()) {
          <button type="button" class="stop" (click)="commanded.emit({ do: 'stop', reason: '' })">
            Stop, supply off
          </button>
        }
      </div>
    </section>
  `,
  styleUrl: './takeover.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LimitTakeover {
  readonly run = input.required<RunView>();
  readonly alarm = input.required<LimitAlarm>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();

  protected readonly text = computed(() => shownFigure(this.alarm().figure.text));
  protected readonly unit = computed(() => shownUnit(this.alarm().figure.unit));
  /** Stopped under the alarm: the alarm is answered first, then the make-safe sheet shows itself. */
  protected readonly isStopped = computed(() => this.run().state.status === 'stopped');
  protected readonly done = computed(() => {
    if (this.isStopped()) return 'It is done: make the car safe';
    const { procedure } = this.run();
    return `It is done: back to step ${procedure.step(this.alarm().step)?.number ?? ''}`;
  });
}
