import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { entryField } from '../entry-draft';
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
  protected readonly isParked = entryField(this.run, 'parked', false);
  protected readonly visited = entryField<readonly string[]>(this.run, 'visited', []);
  protected readonly isNone = computed(() => this.visited().length === 0);

  protected toggle(name: string): void {
    this.visited.update((names) => (names.includes(name) ? names.filter((other) => other !== name) : [...names, name]));
  }

  protected record(): void {
    this.commanded.emit({ do: 'choose', options: this.visited() });
  }
}
