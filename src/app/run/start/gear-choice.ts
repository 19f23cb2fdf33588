import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { GearNeed } from '../../../../procedures/document';
import type { InstrumentSnapshot, RunCommand } from '../../../../procedures/engine/showing';
import type { GearItem } from '../../core/wire';
import { entryField } from '../entry-draft';
import { RefusalLine } from '../frame/refusal-line';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';
import { ReasonField } from '../../shared/reason-field';
import { gearFor, type GearFacts } from './gear-facts';

/** What stands for an instrument that was put back: no instrument's id. */
const noInstrument = 'none';

/** Takes one instrument for one role. An overdue one costs a reason; a coarse one says what that will mean. */
@Component({
  selector: 'bay-gear-choice',
  imports: [PrimaryButton, ReasonField, RefusalLine],
  templateUrl: './gear-choice.html',
  styleUrl: './gear-choice.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GearChoice {
  readonly run = input.required<RunView>();
  readonly need = input.required<GearNeed>();
  readonly place = input.required<number>();
  readonly of = input.required<number>();
  readonly gear = input.required<readonly GearItem[]>();
  readonly now = input.required<number>();
  /** What is chosen already, when it is chosen again. */
  readonly chosen = input<InstrumentSnapshot>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  /** Optional gear is done without. */
  readonly goneWithout = output();

  protected readonly facts = computed(() => gearFor(this.need(), this.gear(), this.now()));
  /** The instrument that was tapped, not yet taken; empty while none was. */
  private readonly tapped = entryField(this.run, () => `instrument ${this.need().role}`, '', ['gear-chosen']);
  protected readonly pickedId = computed(() => (this.tapped() === '' ? this.chosen()?.id : this.tapped()));
  protected readonly reason = entryField(this.run, () => `overdue ${this.need().role}`, '', ['gear-chosen']);
  protected readonly picked = computed<GearFacts | undefined>(() =>
    this.facts().find(({ item }) => item.id === this.pickedId()),
  );

  /** An overdue one that is picked stands alone with its reason; a second tap on it brings the others back. */
  protected readonly offered = computed(() => {
    const picked = this.picked();
    return picked?.isOverdue === true ? [picked] : this.facts();
  });

  protected pick({ item, isOverdue }: GearFacts): void {
    this.tapped.set(isOverdue && this.pickedId() === item.id ? noInstrument : item.id);
  }

  protected take(): void {
    const picked = this.picked();
    if (picked === undefined) return;
    const overdueBecause = picked.isOverdue ? this.reason() : '';
    this.commanded.emit({
      do: 'choose-gear',
      role: this.need().role,
      instrument: picked.instrument,
      ...(overdueBecause === '' ? {} : { overdueBecause }),
    });
  }
}
