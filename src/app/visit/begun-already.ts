import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  output,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { begunWords, isOver, standingWords, workWords, type KnownRun } from '../core/known-runs';
import { ReasonField } from '../shared/reason-field';

/** Says that this half of the visit was begun already, with the ways on: open that run, or begin another with a reason. */
@Component({
  selector: 'bay-begun-already',
  imports: [ReasonField, RouterLink],
  templateUrl: './begun-already.html',
  styleUrl: './begun-already.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BegunAlready {
  /** The runs that are known, the latest first; at least one. */
  readonly runs = input.required<readonly KnownRun[]>();
  readonly procedureTitle = input.required<string>();
  readonly isBusy = input(false);
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();

  /** Another is to be begun, for this reason. */
  readonly again = output<string>();
  readonly left = output();

  protected readonly usuals = ['Repaired since', 'The other one was given up', 'Wrong car or wrong half', 'To compare'];
  protected readonly reason = signal('');
  protected readonly refusal = signal<string | undefined>(undefined);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  protected readonly title = computed(() => {
    const [first] = this.runs();
    const what = first === undefined ? 'procedure' : workWords(first);
    const count = this.runs().length;
    return `The ${what} was begun on this visit already${count > 1 ? `, ${count} times` : ''}`;
  });
  protected readonly lines = computed(() => {
    const firstHere = this.runs().find(({ isHere }) => isHere);
    return this.runs().map((run) => ({
      runId: run.runId,
      isHere: run.isHere,
      isLoud: run === firstHere,
      begun: begunWords(run, this.now()),
      stands: standingWords(run),
      elsewhere: isOver(run) ? 'It was done there.' : 'It goes on there.',
    }));
  });
  protected readonly hasOneHere = computed(() => this.runs().some(({ isHere }) => isHere));

  constructor() {
    afterNextRender(() => this.heading().nativeElement.focus());
  }

  protected begin(): void {
    const reason = this.reason().trim();
    this.refusal.set(reason === '' ? 'Say why another is begun: it is kept with the run.' : undefined);
    if (reason !== '') this.again.emit(reason);
  }
}
