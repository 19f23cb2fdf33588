import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { areUnaware, workWords } from '../core/known-runs';
import { tabletWords } from '../core/tablet-words';
import { clockTime } from '../core/time-words';
import type { VisitRun } from '../core/wire';
import { ResultMark } from '../shared/result-mark';
import { dayText } from './record-time';
import { statusWords } from './record-words';

/** The runs of one half of a visit side by side: who began each, when, on which tablet, why, and what it found. */
@Component({
  selector: 'bay-same-half',
  imports: [ResultMark, RouterLink],
  templateUrl: './same-half.html',
  styleUrl: './same-half.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SameHalf {
  /** At least two, the first begun first. */
  readonly runs = input.required<readonly VisitRun[]>();
  /** The one that is shown. */
  readonly shown = input.required<string>();

  protected readonly unaware = computed(() => {
    const runs = this.runs();
    if (!areUnaware(runs)) return undefined;
    return runs.length === 2
      ? 'They were begun without knowing of each other.'
      : 'Not each was begun knowing of the others.';
  });
  protected readonly title = computed(() => {
    const [first] = this.runs();
    return `${this.runs().length} runs of the same ${first === undefined ? 'procedure' : workWords(first)}`;
  });
  protected readonly cards = computed(() =>
    this.runs().map((run, place) => ({
      runId: run.runId,
      isShown: run.runId === this.shown(),
      name: `Run ${place + 1}`,
      begun: `${dayText(run.openedAt)}, ${clockTime(run.openedAt)}`,
      by: run.personName,
      tablet: run.tabletLabel === undefined ? 'a tablet that is not known' : tabletWords(run.tabletLabel),
      status: statusWords[run.status],
      result: run.result,
      verdict: run.verdict,
      because: run.again?.because,
    })),
  );
}
