import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { RunCommand } from '../../../../procedures/engine/showing';
import type { GearItem } from '../../core/wire';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';
import { GearChoice } from '../start/gear-choice';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';

/** The run's instruments, each of which can be chosen anew: what was read before stays with the one it was read with. */
@Component({
  selector: 'bay-gear-sheet',
  imports: [GearChoice, PrimaryButton, SheetBody, SheetHand],
  template: `
    <bay-sheet-hand>
      @if (need(); as need) {
        <bay-gear-choice
          [run]="run()"
          [need]="need"
          [place]="place()"
          [of]="needs().length"
          [gear]="gear()"
          [now]="now()"
          [chosen]="run().state.gear[need.role]"
          [problem]="problem()"
          [isBusy]="isBusy()"
          (commanded)="commanded.emit($event)"
          (goneWithout)="role.set(undefined)"
        />
      } @else {
        <bay-sheet-body>
          <h2>Gear for this run</h2>
          @if (problem(); as problem) {
            <p class="error" role="alert">{{ problem.message }}</p>
          }
          @for (need of needs(); track need.role) {
            <button type="button" class="need" (click)="role.set(need.role)">
              <span>{{ need.label }}</span><b>{{ run().state.gear[need.role]?.label ?? 'none' }}</b>
            </button>
          }
        </bay-sheet-body>
        <button type="button" bayPrimary class="back" (click)="left.emit()">Back to the step</button>
      }
    </bay-sheet-hand>
  `,
  styles: `
    :host {
      display: contents;
    }
    h2 {
      padding: 0 6px 4px;
      border-bottom: 3px solid var(--live);
      font-size: 24px;
      color: var(--ink);
    }
    .need {
      display: grid;
      grid-template-columns: 1fr auto;
      align-items: center;
      gap: 12px;
      flex: none;
      min-height: calc(10.5 * var(--mm));
      padding: 4px 18px;
      text-align: left;
      line-height: 1.2;
    }
    b {
      font-size: 22px;
    }
    .back {
      flex: none;
      margin-top: auto;
      min-height: var(--touch-primary);
      font-size: 26px;
    }
    @media (max-width: 640px) {
      h2 {
        font-size: 19px;
      }
      .need {
        font-size: 15px;
        padding: 2px 10px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GearSheet {
  readonly run = input.required<RunView>();
  readonly gear = input.required<readonly GearItem[]>();
  readonly now = input.required<number>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly left = output();

  protected readonly role = signal<string | undefined>(undefined);
  protected readonly needs = computed(() => this.run().procedure.document.gear);
  protected readonly need = computed(() => this.needs().find(({ role }) => role === this.role()));
  protected readonly place = computed(() => this.needs().findIndex(({ role }) => role === this.role()) + 1);
}
