import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ProcedureFit } from '../core/procedure-fit';
import type { Half } from './run-beginner';

/** What may be begun: the whole procedure, or one half of a pair. */
interface Beginning {
  readonly half: Half | undefined;
  readonly words: string;
}

/** One procedure that may be run on the car: what it shows, why it fits, and how it begins. */
@Component({
  selector: 'bay-procedure-card',
  templateUrl: './procedure-card.html',
  styleUrl: './procedure-card.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureCard {
  readonly fit = input.required<ProcedureFit>();
  /** Whether it is the best fit: then its beginning is the loud thing of the page. */
  readonly isFirst = input(false);
  /** The halves that were begun on this visit. */
  readonly begun = input<readonly Half[]>([]);
  readonly isBusy = input(false);

  readonly started = output<Half | undefined>();

  protected readonly document = computed(() => this.fit().procedure.document);
  protected readonly why = computed(() => [...this.fit().codes, ...this.fit().symptoms].join(', '));
  protected readonly beginnings = computed<readonly Beginning[]>(() => {
    if (this.document().pair !== true) return [{ half: undefined, words: 'Start' }];
    const begun = this.begun();
    return [
      { half: 'cold', words: begun.includes('cold') ? 'Cold half again' : 'Start the cold half' },
      { half: 'warm', words: begun.includes('warm') ? 'Warm half again' : 'Start the warm half' },
    ];
  });
  /** The half that comes next is the loud one: cold first, then the one that is not begun. */
  protected readonly next = computed<Half | undefined>(() => {
    if (this.document().pair !== true) return undefined;
    return this.begun().includes('cold') && !this.begun().includes('warm') ? 'warm' : 'cold';
  });
}
