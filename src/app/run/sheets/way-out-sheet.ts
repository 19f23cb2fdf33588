import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import type { Step } from '../../../../procedures/document';
import { renderTemplate, type RunCommand } from '../../../../procedures/engine/showing';
import { entryField } from '../entry-draft';
import type { HonestWay } from '../frame/honest-ways';
import { RefusalLine } from '../frame/refusal-line';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';
import { ReasonField } from '../../shared/reason-field';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';

interface WayWords {
  readonly title: string;
  readonly label: string;
  readonly usuals: readonly string[];
  readonly primary: string;
}

/** A way out as the sheet shows it: what was asked for, or that the step does not apply. */
type ShownWay = HonestWay | 'not-applicable';

const words: Readonly<Record<ShownWay, WayWords>> = {
  'not-applicable': {
    title: 'Does not apply to this car',
    label: 'Why it does not apply',
    usuals: ['The car does not have this part', 'It is built another way', 'It was done already', 'Not on this engine'],
    primary: 'Does not apply,\ngo on',
  },
  'cannot-measure': {
    title: 'Cannot measure',
    label: 'Why not',
    usuals: ['No access', 'The instrument fails', 'The reading does not settle', 'The car does not have it'],
    primary: 'Cannot measure,\ngo on',
  },
  'not-sure': {
    title: 'Not sure',
    label: 'What the lead is asked',
    usuals: [
      'Is this the right part?',
      'Does this step fit this car?',
      'Is this reading to be believed?',
      'Is it safe to go on?',
    ],
    primary: 'Make safe,\nask the lead',
  },
  'set-aside': {
    title: 'Set aside',
    label: 'Why',
    usuals: ['Phone call', 'Another car first', 'A part is missing', 'End of shift'],
    primary: 'Set aside',
  },
};

/** One of the three honest ways out: what it leads to, a reason, and two controls, one of them back. That a step does not
 * apply to the car is said from where nothing can be measured. */
@Component({
  selector: 'bay-way-out-sheet',
  imports: [PrimaryButton, ReasonField, RefusalLine, SheetBody, SheetHand],
  templateUrl: './way-out-sheet.html',
  styleUrl: './way-out-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WayOutSheet {
  readonly run = input.required<RunView>();
  readonly step = input<Step>();
  readonly way = input.required<HonestWay>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly left = output();

  protected readonly shown = linkedSignal<HonestWay, ShownWay>({ source: this.way, computation: (way) => way });
  protected readonly reason = entryField(this.run, () => this.shown(), '', ['set-aside', 'lead-called']);
  protected readonly words = computed(() => words[this.shown()]);
  /** Why the way is not open, where it is not. */
  protected readonly closed = computed(() => {
    const step = this.step();
    if (this.shown() !== 'cannot-measure' || (step !== undefined && 'cannotMeasure' in step)) return undefined;
    return 'Nothing is measured in this step. If it cannot be done, ask the lead under Not sure, or stop the test.';
  });
  /** Whether a step can be said not to apply: what begins a run, puts back or comes back from a call always does. */
  protected readonly canApplyNot = computed(() => {
    const kind = this.step()?.kind;
    const always = kind === 'start' || kind === 'restore' || kind === 'call' || kind === 'finding';
    return this.shown() === 'cannot-measure' && kind !== undefined && !always;
  });
  private readonly isMeasuring = computed(() => this.shown() === 'cannot-measure' || this.shown() === 'not-applicable');
  /** The exit that the author wrote for it. */
  protected readonly exit = computed(() => {
    const step = this.step();
    if (this.isMeasuring() === false || step === undefined || !('cannotMeasure' in step)) return undefined;
    const { procedure, state } = this.run();
    const { to, because, verdict } = step.cannotMeasure;
    const target = procedure.step(to === 'verdict' ? (verdict ?? state.verdict ?? to) : to);
    const heading = verdict === undefined ? undefined : procedure.step(verdict)?.title;
    return {
      target: target === undefined ? to : `${target.kind === 'finding' ? 'Finding' : target.number}, ${target.title}`,
      because: renderTemplate(procedure, state, because) ?? because,
      heading: target?.kind === 'finding' ? undefined : heading,
    };
  });
  protected readonly makeSafe = computed(() =>
    this.shown() === 'not-sure' ? this.run().procedure.document.stop.makeSafe : [],
  );

  protected confirm(): void {
    const reason = this.reason();
    switch (this.shown()) {
      case 'cannot-measure':
        return this.commanded.emit({ do: 'cannot-measure', reason });
      case 'not-applicable':
        return this.commanded.emit({ do: 'not-applicable', reason });
      case 'not-sure':
        return this.commanded.emit({ do: 'not-sure', question: reason });
      case 'set-aside':
        return this.commanded.emit({ do: 'set-aside', reason });
    }
  }
}
