import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { begunWords, standingWords, workWords, type KnownRun } from '../core/known-runs';

/** Says that the same half of a visit was begun more than once without that one knew of the other. */
@Component({
  selector: 'bay-twice-begun',
  template: `
    <p>
      <b>{{ title() }}</b> {{ unaware() }} agree on which goes on.
    </p>
    <ul>
      @for (line of lines(); track line.runId) {
        <li>{{ line.words }}</li>
      }
    </ul>
    <ng-content />
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      padding: 14px 18px;
      background: var(--live-wash);
      border: 2px solid var(--live);
      border-radius: 12px;
    }
    ul {
      display: grid;
      gap: 4px;
      padding-left: 22px;
    }
  `,
  host: { role: 'status' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TwiceBegun {
  /** At least two runs of the same half, the latest first. */
  readonly runs = input.required<readonly KnownRun[]>();
  /** The order and the car, where the page does not say it. */
  readonly about = input<string>();
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();

  protected readonly title = computed(() => {
    const runs = this.runs();
    const what = runs[0] === undefined ? 'procedure' : workWords(runs[0]);
    const times = runs.length === 2 ? 'twice' : `${runs.length} times`;
    const about = this.about();
    return `${about === undefined ? 'The' : `${about}: the`} ${what} was begun ${times}.`;
  });
  protected readonly unaware = computed(() =>
    this.runs().length === 2
      ? 'Neither knew of the other. Both are kept;'
      : 'Not each was begun knowing of the others. All are kept;',
  );
  protected readonly lines = computed(() =>
    this.runs().map((run) => ({
      runId: run.runId,
      words: `${begunWords(run, this.now())}: ${standingWords(run)}`,
    })),
  );
}
