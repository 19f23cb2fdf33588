import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit, type RunState } from '../../../procedures/engine/showing';
import type { PublishedProcedure } from '../core/wire';
import { clockTime } from '../core/time-words';
import { dayText, durationText, momentOf } from './record-time';
import { statusWords } from './record-words';

/** The left column of a record: which car, which order, by whom, by which version, with which instruments, when. */
@Component({
  selector: 'bay-record-summary',
  templateUrl: './record-summary.html',
  styleUrl: './record-summary.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordSummary {
  readonly state = input.required<RunState>();
  readonly procedure = input.required<PublishedProcedure>();
  /** The tablets that wrote, in their order. */
  readonly tablets = input.required<readonly string[]>();
  /** The last event that could be replayed, where the replay broke off before the end. */
  readonly toldThrough = input<number>();
  /** When the server got the first of it. */
  readonly receivedAt = input<string | number>();

  protected readonly odometer = computed(() => {
    const { text, unit } = this.state().visit.odometer;
    return `${grouped(text)} ${unit}`;
  });
  protected readonly half = computed(() => {
    const { half } = this.state().header;
    return half === undefined ? undefined : `${half} half`;
  });
  protected readonly when = computed(() => {
    const { openedAt, lastAt, status } = this.state();
    const told = this.toldThrough();
    if (told !== undefined) {
      return { day: dayText(openedAt), opened: `opened ${clockTime(openedAt)}`, end: `told up to event ${told} only` };
    }
    const isOver = status === 'closed' || status === 'signed';
    const end = isOver ? `closed ${clockTime(lastAt)}, ${durationText(lastAt - openedAt)}` : statusWords[status];
    return { day: dayText(openedAt), opened: `opened ${clockTime(openedAt)}`, end };
  });
  protected readonly version = computed(() => {
    const { version, publishedAt, publishedBy, status } = this.procedure();
    const by = `published ${dayText(Date.parse(publishedAt))} by ${publishedBy}`;
    return { number: version, by, isWithdrawn: status === 'withdrawn' };
  });
  protected readonly gear = computed(() => {
    const { gear, openedAt } = this.state();
    return Object.values(gear).map(({ label, dueOn }) => {
      const isOverdue = Date.parse(dueOn) + millisecondsInDay <= openedAt;
      return { label, due: `${isOverdue ? 'was due' : 'due'} ${dayText(Date.parse(dueOn))}`, isOverdue };
    });
  });
  protected readonly inputs = computed(() => {
    const declared = this.procedure().document.inputs;
    return Object.entries(this.state().inputs).map(([name, { text, unit, source }]) => ({
      name,
      label: declared.find((input) => input.name === name)?.label ?? name,
      text: `${text} ${shownUnit(unit)}`.trim(),
      source,
    }));
  });
  protected readonly received = computed(() => {
    const at = this.receivedAt();
    return at === undefined ? undefined : `${dayText(momentOf(at))}, ${clockTime(momentOf(at))}`;
  });
}

/** A check holds through the whole of its last day. */
const millisecondsInDay = 86_400_000;

/** 84210 -> 84,210; digits behind a point stay. */
function grouped(text: string): string {
  return text.replace(/\B(?=(\d{3})+(?!\d)(?!.*\d*\.))/g, ',');
}
