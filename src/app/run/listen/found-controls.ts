import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { previewListening } from '../../../../procedures/engine';
import type { RunCommand, Series } from '../../../../procedures/engine/showing';
import { BigAction } from '../frame/big-action';
import { JudgedLine } from '../readings/judged-line';
import type { RunProblem, RunView } from '../run-view';
import type { StepOf } from '../step-entry';
import { anotherFile, type ListenDone } from './listen-requests';

/** A ramp that came as a file and has no marks: what is found in it, judged, and what could not be found. */
@Component({
  selector: 'bay-found-controls',
  imports: [BigAction, JudgedLine],
  template: `
    <div class="found scrolls" tabindex="-1">
      @for (value of found(); track value.name) {
        <bay-judged-line [value]="value" />
      }
      @for (problem of problems(); track problem) {
        <p class="remark">{{ problem }}</p>
      }
    </div>
    <div class="row pair">
      <button type="button" [disabled]="isBusy()" (click)="takeAnotherFile()">Another file</button>
    </div>
    <bay-big-action
      label="Keep the ramp
and go on"
      [refusal]="problem()?.message"
      [isBusy]="isBusy()"
      (done)="finished.emit({ series: series(), marks: [] })"
    />
  `,
  styleUrl: './listen-controls.css',
  styles: `
    .found {
      flex: 0 1 auto;
      min-height: 0;
      display: grid;
      align-content: start;
      gap: 10px;
      overflow: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FoundControls {
  readonly run = input.required<RunView>();
  readonly step = input.required<StepOf<'ramp'>>();
  readonly series = input.required<Series>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly finished = output<ListenDone>();

  private readonly preview = computed(() => {
    if (this.series().timeS.length < 3) return undefined;
    const { procedure, state } = this.run();
    return previewListening(procedure, state, this.series());
  });
  protected readonly found = computed(() => this.preview()?.values ?? []);
  protected readonly problems = computed(() => this.preview()?.problems ?? []);

  protected takeAnotherFile(): void {
    this.commanded.emit(anotherFile(this.step().id));
  }
}
