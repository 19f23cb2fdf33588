import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { GearItem } from '../../core/wire';
import { entryField } from '../entry-draft';
import { BigAction } from '../frame/big-action';
import { CautionGate } from '../frame/caution-gate';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import { GearChoice } from '../later';
import { startStage } from './start-stages';

/** The start card: what must be ready, what to do at once in danger, the cautions that hold throughout, the gear. */
@Component({
  selector: 'bay-start-entry',
  imports: [BigAction, CautionGate, GearChoice, HandSide, NgTemplateOutlet, WideSide],
  templateUrl: './start-entry.html',
  styleUrl: './start-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StartEntry extends StepEntry<'start'> {
  /** The site's instruments. */
  readonly gear = input.required<readonly GearItem[]>();
  /** The device's clock, for due dates. */
  readonly now = input.required<number>();

  private readonly isPrepared = entryField(this.run, 'is-prepared', false);
  private readonly knowsStopActions = entryField(this.run, 'knows-stop-actions', false);
  private readonly without = entryField<readonly string[]>(this.run, 'without', []);
  /** The role whose gear is chosen again; empty while none is. */
  protected readonly again = entryField(this.run, 'again', '');

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
    this.again.set('');
  }

  protected chooseAgain(role: string): void {
    this.without.update((roles) => roles.filter((other) => other !== role));
    this.again.set(role);
  }
}
