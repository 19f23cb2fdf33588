import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ResultMark } from '../shared/result-mark';
import type { Passage } from './story-line';

/** Which step a claim was of, with its result where one was judged. */
@Component({
  selector: 'bay-passage-title',
  imports: [ResultMark],
  template: `
    @if (passage().step; as step) {
      <span class="number num">{{ isFinding() ? '' : step.number }}</span>
      <span class="title">{{ isFinding() ? 'Finding: ' + step.title : step.title }}</span>
    } @else {
      <span class="title">Before the first step</span>
    }
    @if (shown(); as result) {
      <bay-result-mark [result]="result" [size]="18" />
    }
    @if (passage().within; as call) {
      <span class="within">in {{ call.number }}, {{ call.title }}</span>
    }
    @if (passage().isLeft) {
      <span class="muted">left behind</span>
    }
  `,
  styles: `
    :host {
      line-height: 1.25;
    }
    .number {
      margin-right: 6px;
    }
    .number:empty {
      display: none;
    }
    .title {
      font-weight: 600;
    }
    .within {
      display: block;
      color: var(--ink-2);
      font-size: 15px;
    }
    bay-result-mark,
    .muted {
      margin-left: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PassageTitle {
  readonly passage = input.required<Passage>();

  /** Whether the result is drawn here: not where the row beside it says it. */
  readonly isMarked = input(true);

  protected readonly isFinding = computed(() => this.passage().step?.kind === 'finding');
  /** A step that was only done needs no mark: its row says when. */
  protected readonly shown = computed(() => {
    const { result } = this.passage();
    return result === 'done' || !this.isMarked() ? undefined : result;
  });
}
