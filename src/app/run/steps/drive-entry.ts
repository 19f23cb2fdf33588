import { ChangeDetectionStrategy, Component, computed, linkedSignal } from '@angular/core';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';

/** A road test: nothing is entered while the car moves. After parking the windows that were visited are ticked. */
@Component({
  selector: 'bay-drive-entry',
  imports: [BigAction, HandSide, WideSide],
  templateUrl: './drive-entry.html',
  styleUrl: './drive-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DriveEntry extends StepEntry<'drive'> {
  private readonly claim = computed(() => this.run().state.current?.claimedSeq);
  protected readonly isParked = linkedSignal<number | undefined, boolean>({
    source: this.claim,
    computation: () => false,
  });
  protected readonly visited = linkedSignal<number | undefined, readonly string[]>({
    source: this.claim,
    computation: () => [],
  });
  protected readonly isNone = computed(() => this.visited().length === 0);

  protected toggle(name: string): void {
    this.visited.update((names) => (names.includes(name) ? names.filter((other) => other !== name) : [...names, name]));
  }

  protected record(): void {
    this.commanded.emit({ do: 'choose', options: this.visited() });
  }
}
