import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { PrimaryButton } from '../primary-action';
import type { RunView } from '../run-view';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';

/** A reading no longer holds: why, and one tap to the step that takes it again. */
@Component({
  selector: 'bay-take-again-sheet',
  imports: [PrimaryButton, SheetBody, SheetHand],
  template: `
    <bay-sheet-hand>
      <bay-sheet-body>
        <h2>A reading no longer holds</h2>
        <p class="error" role="alert">{{ said() }}</p>
        @if (title(); as title) {
          <p>Step {{ number() }}: {{ title }}. What was read there stays in the record.</p>
        }
      </bay-sheet-body>
      <div class="controls">
        <button type="button" class="plain" (click)="left.emit()">Back to the step</button>
        <button type="button" bayPrimary [disabled]="isBusy()" (click)="takenAgain.emit(of())">
          Take step {{ number() }} again
        </button>
      </div>
    </bay-sheet-hand>
  `,
  styleUrl: './way-out-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TakeAgainSheet {
  readonly run = input.required<RunView>();
  /** The step that gave the reading. */
  readonly of = input.required<string>();
  readonly said = input.required<string>();
  readonly isBusy = input(false);
  readonly takenAgain = output<string>();
  readonly left = output();

  private readonly step = computed(() => this.run().procedure.step(this.of()));
  protected readonly number = computed(() => this.step()?.number ?? this.of());
  protected readonly title = computed(() => this.step()?.title);
}
