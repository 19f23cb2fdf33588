import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import type { GearItem } from '../../core/wire';
import { BigAction } from '../frame/big-action';
import { CautionGate } from '../frame/caution-gate';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import { GearChoice } from './gear-choice';
import { startStage } from './start-stages';

/** The start card: what must be ready, what to do at once in danger, the cautions that hold throughout, the gear. */
@Component({
  selector: 'bay-start-entry',
  imports: [BigAction, CautionGate, GearChoice, HandSide, WideSide],
  templateUrl: './start-entry.html',
  styleUrl: './start-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StartEntry extends StepEntry<'start'> {
  /** The site's instruments. */
  readonly gear = input.required<readonly GearItem[]>();
  /** The device's clock, for due dates. */
  readonly now = input.required<number>();

  private readonly isPrepared = signal(false);
  private readonly knowsStopActions = signal(false);
  private readonly without = signal<readonly string[]>([]);
  protected readonly again = signal<string | undefined>(undefined);

  protected readonly card = computed(() => this.run().procedure.document.start);
  protected readonly document = computed(() => this.run().procedure.document);
  protected readonly stage = computed(() =>
    startStage(this.run(), this.step(), {
      isPrepared: this.isPrepared(),
      knowsStopActions: this.knowsStopActions(),
      without: this.without(),
      again: this.again(),
    }),
  );
  /** What the whole run starts with, for the last look. */
  protected readonly chosen = computed(() =>
    this.document().gear.map((need) => ({ need, instrument: this.run().state.gear[need.role] })),
  );

  protected prepare(): void {
    this.isPrepared.set(true);
  }

  protected know(): void {
    this.knowsStopActions.set(true);
  }

  protected goWithout(role: string): void {
    this.without.update((roles) => [...roles, role]);
    this.again.set(undefined);
  }

  protected chooseAgain(role: string): void {
    this.without.update((roles) => roles.filter((other) => other !== role));
    this.again.set(role);
  }
}
