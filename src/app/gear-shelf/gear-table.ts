import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { ShelvedItem } from './gear-shelf-store';
import { accuracyText, dayText, kindWords, rangeText, stepText } from './gear-words';

/** Instruments, one row for each of what it shows. */
@Component({
  selector: 'bay-gear-table',
  templateUrl: './gear-table.html',
  styleUrl: './gear-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GearTable {
  readonly items = input.required<readonly ShelvedItem[]>();

  protected readonly kind = kindWords;
  protected readonly range = rangeText;
  protected readonly step = stepText;
  protected readonly accuracy = accuracyText;
  protected readonly dayText = dayText;
}
