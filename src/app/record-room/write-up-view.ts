import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { writeUpParts, type WriteUp } from '../../../procedures/engine';
import type { Citation, RunEventData } from '../../../procedures/engine/showing';

/** The write-up as it was kept, with what the record itself gave where a person edited it, and what each part rests on. */
@Component({
  selector: 'bay-write-up-view',
  templateUrl: './write-up-view.html',
  styleUrl: './write-up-view.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WriteUpView {
  /** As it was kept; absent where nobody has kept one yet. */
  readonly kept = input<RunEventData['write-up-written']>();
  /** As the record gives it now. */
  readonly composed = input<WriteUp>();

  /** The event that a sentence rests on should come into sight. */
  readonly cited = output<number>();

  protected readonly parts = computed(() => {
    const kept = this.kept();
    const composed = this.composed();
    return writeUpParts.map((part) => ({
      part,
      label: labels[part],
      text: kept?.[part] ?? composed?.[part].text ?? '',
      isEdited: kept?.edited.includes(part) ?? false,
      composed: composed?.[part].text ?? '',
      cites: distinct(composed?.[part].sentences.flatMap(({ cites }) => cites) ?? []),
    }));
  });
}

const labels = { concern: 'Concern', cause: 'Cause', correction: 'Correction', customer: 'For the customer' } as const;

/** Each step once, in the order in which they are cited. */
function distinct(cites: readonly Citation[]): readonly Citation[] {
  return cites.filter((cite, index) => cites.findIndex(({ step }) => step === cite.step) === index);
}
