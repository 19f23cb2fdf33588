import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { dueAt } from '../../../../procedures/engine/showing';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { RefusalLine } from '../frame/refusal-line';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import { RestoreList } from './restore-list';

/** Puts back everything that is still disturbed: one big tick each; the last one goes on. */
@Component({
  selector: 'bay-restore-entry',
  imports: [BigAction, HandSide, RefusalLine, RestoreList, WideSide],
  template: `
    <bay-wide-side [run]="run()" [step]="step()" />
    <bay-hand-side>
      <h2>{{ items().length === 0 ? 'Everything is back' : 'To be put back: ' + items().length }}</h2>
      <bay-restore-list
        [items]="items()"
        [isBusy]="isBusy()"
        (restored)="commanded.emit({ do: 'restore', item: $event })"
      />
      @if (items().length === 0) {
        <bay-big-action
          label="All is back,
go on"
          [refusal]="problem()?.message"
          [isBusy]="isBusy()"
          (done)="commanded.emit({ do: 'confirm' })"
        />
      } @else {
        <bay-refusal-line [refusal]="problem()?.message" />
      }
    </bay-hand-side>
  `,
  styles: `
    :host {
      display: contents;
    }
    h2 {
      flex: none;
      padding: 4px 6px 6px;
      border-bottom: 3px solid var(--live);
      font-size: 26px;
      color: var(--ink);
    }
    @media (max-width: 640px) {
      h2 {
        font-size: 20px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RestoreEntry extends StepEntry<'restore'> {
  /** In a called procedure only what that one took apart; the rest goes back with the caller's own step. */
  protected readonly items = computed(() => dueAt(this.run().procedure, this.run().state, this.step().id));
}
