import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SyncView } from '../core/sync-view';
import { syncWords } from './sync-words';

/** Where sending stands: offline and since when, what is kept here, how far a sync has come, or what was refused. */
@Component({
  selector: 'bay-sync-chip',
  template: `<span class="chip" [class.live]="words().tone === 'live'" [class.out]="words().tone === 'out'">
    {{ words().text }}
  </span>`,
  styles: ':host { display: inline-flex; min-width: 0 } .chip { line-height: 1.2 }',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'status' },
})
export class SyncChip {
  readonly view = input.required<SyncView>();

  protected readonly words = computed(() => syncWords(this.view()));
}
