import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Step } from '../../../../procedures/document';
import type { RunCommand } from '../../../../procedures/engine/showing';
import { CautionPanel } from '../../shared/caution-panel';
import { PrimaryButton } from '../primary-action';
import type { RunView } from '../run-view';
import { cautionsOf } from '../step-cautions';

/**
 * Stands before the entry of a step until its cautions are acknowledged, one tap each. It repeats the caution in
 * large type on the side where the eye and the hand are.
 */
@Component({
  selector: 'bay-caution-gate',
  imports: [CautionPanel, PrimaryButton],
  template: `
    <h2>
      Before anything is entered
      @if (count() > 1) {
        <span class="num">{{ caution() + 1 }} of {{ count() }}</span>
      }
    </h2>
    @if (shown(); as shown) {
      <bay-caution [word]="shown.word" [text]="shown.text" />
    }
    <button type="button" bayPrimary [disabled]="isBusy()" (click)="acknowledge()">I have read it</button>
  `,
  styleUrl: './caution-gate.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CautionGate {
  readonly run = input.required<RunView>();
  readonly step = input.required<Step>();
  /** Its place in the step's list. */
  readonly caution = input.required<number>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();

  private readonly all = computed(() => cautionsOf(this.run(), this.step()));
  protected readonly count = computed(() => this.all().length);
  protected readonly shown = computed(() => this.all()[this.caution()]);

  protected acknowledge(): void {
    this.commanded.emit({ do: 'acknowledge-caution', caution: this.caution() });
  }
}
