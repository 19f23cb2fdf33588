import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { previewResults, resultsOf } from '../../../../procedures/engine';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { JudgedLine } from '../readings/judged-line';
import { StepEntry } from '../step-entry';
import { formulaParts } from './formula-words';

/** Results that follow from what was measured: each with its formula, the numbers put in, and its band. */
@Component({
  selector: 'bay-compute-entry',
  imports: [BigAction, HandSide, JudgedLine, WideSide],
  template: `
    <bay-wide-side [run]="run()" [step]="step()">
      @for (result of results(); track result.name) {
        <div class="formula">
          <b>{{ result.label }}</b>
          <p>
            @for (part of result.parts; track $index) {
              @if (part.kind === 'value') {
                <span class="put" [class.missing]="part.value === undefined">
                  <small>{{ part.label }}</small>
                  <span class="num">{{ part.value ?? 'not measured' }}</span>
                </span>
              } @else {
                <span class="sign">{{ part.text }}</span>
              }
            }
          </p>
        </div>
      }
    </bay-wide-side>
    <bay-hand-side>
      @for (result of results(); track result.name) {
        @if (result.value; as value) {
          <bay-judged-line [value]="value" />
        } @else {
          <p class="none">{{ result.label }}: cannot be computed, what it needs was not measured.</p>
        }
      }
      <bay-big-action
        label="Seen,
go on"
        [refusal]="problem()?.message"
        [isBusy]="isBusy()"
        (done)="commanded.emit({ do: 'confirm' })"
      />
    </bay-hand-side>
  `,
  styleUrl: './compute-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComputeEntry extends StepEntry<'compute'> {
  protected readonly results = computed(() => {
    const { procedure, state } = this.run();
    const values = previewResults(procedure, state);
    return resultsOf(this.step()).map(({ name, label, is }) => ({
      name,
      label,
      parts: formulaParts(this.run(), is),
      value: values.find((value) => value.name === name),
    }));
  });
}
