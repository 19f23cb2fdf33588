import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { clockTime, howLong } from '../core/time-words';
import { RouteRibbon } from '../shared/route-ribbon';
import type { OpenRun } from './bench-store';
import { lowerFirst } from '../../../procedures/engine/showing';

/** One open run: the car, the step, the way so far, what is disturbed, and the way back to it. */
@Component({
  selector: 'bay-run-card',
  imports: [RouteRibbon, RouterLink],
  templateUrl: './run-card.html',
  styleUrl: './run-card.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunCard {
  readonly run = input.required<OpenRun>();
  /** Whether it is the one on the car now: the loud thing of the Bench. */
  readonly isFirst = input(false);
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();

  protected readonly summary = computed(() => this.run().summary);
  protected readonly about = computed(() => {
    const { repairOrder, codes, concern } = this.summary();
    return [`RO ${repairOrder}`, codes[0] ?? concern].join(' · ');
  });
  protected readonly sentence = computed(() => {
    const { current, verdict, procedureTitle } = this.summary();
    if (verdict !== undefined) return `Finding: ${verdict}. The write-up waits.`;
    if (!current) return procedureTitle;
    return `Step ${current.number}: ${lowerFirst(current.action)}`;
  });
  protected readonly disturbed = computed(() => {
    const items = this.summary().disturbed;
    return items.length === 0 ? undefined : `${items.length} disturbed: ${items.join(', ')}`;
  });
  protected readonly since = computed(() => {
    const { pause, status } = this.summary();
    if (!pause) return `last touched ${howLong(this.now() - this.run().changedAt)} ago`;
    const what = status === 'stopped' ? 'stopped' : status === 'lead-called' ? 'waits for the lead since' : 'set aside';
    const when = status === 'lead-called' ? clockTime(pause.at) : `${howLong(this.now() - pause.at)} ago`;
    return `${what} ${when}${pause.reason === '' ? '' : `: ${pause.reason}`}`;
  });
  protected readonly action = computed(() => {
    const { current, verdict } = this.summary();
    if (verdict !== undefined) return 'Go to the write-up';
    return current ? `Go back to step ${current.number}` : 'Go on';
  });
}
