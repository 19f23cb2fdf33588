import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { LastReading } from '../frame/last-reading';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';

/** Do it, confirm it. What it takes apart is said before it is done. */
@Component({
  selector: 'bay-action-entry',
  imports: [BigAction, HandSide, LastReading, WideSide],
  template: `
    <bay-wide-side [run]="run()" [step]="step()" />
    <bay-hand-side>
      <bay-last-reading [run]="run()" />
      @if (disturbs().length > 0) {
        <div class="opens">
          <b>Goes on the list of what is disturbed</b>
          @for (item of disturbs(); track item.item) {
            <span>{{ item.label }}</span>
          }
        </div>
      }
      <bay-big-action
        [label]="'Done,\\ngo on'"
        [refusal]="problem()?.message"
        [isBusy]="isBusy()"
        (done)="commanded.emit({ do: 'confirm' })"
      />
    </bay-hand-side>
  `,
  styles: `
    :host {
      display: contents;
    }
    .opens {
      display: grid;
      gap: 2px;
      margin-top: 6px;
      padding: 12px 16px;
      border: 2px solid var(--live);
      border-radius: var(--r);
      background: var(--live-wash);
      color: var(--live);
    }
    .opens b {
      font-weight: 600;
    }
    .opens span {
      font-size: 24px;
      font-weight: 600;
      line-height: 1.2;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ActionEntry extends StepEntry<'action'> {
  protected readonly disturbs = computed(() => this.step().disturbs ?? []);
}
