import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { shownUnit } from '../../../procedures/engine/showing';
import type { ProcedureDocument, Step } from '../../../procedures/document';
import { CautionPanel } from '../shared/caution-panel';
import { conditionWords, nameBook } from './condition-words';
import type { FileProblem } from './read-procedure-file';
import { kindWords } from './kind-words';
import { factsOf } from './step-facts';
import { quantitiesOf } from './step-quantities';
import { waysOf } from './step-ways';

/** One step, to be read: what it asks, what it takes, and where it goes on. */
@Component({
  selector: 'bay-step-reading',
  imports: [CautionPanel],
  templateUrl: './step-reading.html',
  styleUrl: './step-reading.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepReading {
  readonly document = input.required<ProcedureDocument>();
  readonly step = input.required<Step>();
  /** What must be mended in this step. */
  readonly problems = input<readonly FileProblem[]>([]);

  /** What to think about in this step. */
  readonly warnings = input<readonly FileProblem[]>([]);

  /** The person wants to read another step. */
  readonly goTo = output<string>();

  protected readonly kinds = kindWords;
  protected readonly unit = shownUnit;
  private readonly names = computed(() => nameBook(this.document()));
  protected readonly ways = computed(() => waysOf(this.document(), this.names(), this.step()));
  protected readonly hasConditions = computed(() => this.ways().some(({ source }) => source !== undefined));
  protected readonly quantities = computed(() =>
    quantitiesOf(this.step(), (text) => conditionWords(text, this.names())),
  );
  protected readonly quantitiesTitle = computed(() => {
    const { kind } = this.step();
    if (kind === 'listen' || kind === 'ramp') return 'What it finds';
    return kind === 'reading' || kind === 'wait' || kind === 'hold' || kind === 'call'
      ? 'What it takes'
      : 'What it computes';
  });
  /** What it asks of people and time. */
  protected readonly facts = computed(() => factsOf(this.document(), this.step()));
  /** The start card's own cautions hold throughout. */
  protected readonly cautions = computed(() => {
    const step = this.step();
    const throughout = step.kind === 'start' ? this.document().start.throughout : [];
    return [...throughout, ...(step.cautions ?? [])];
  });
  protected readonly until = computed(() => {
    const step = this.step();
    return step.kind === 'wait'
      ? { condition: conditionWords(step.until, this.names()), meanwhile: step.meanwhile }
      : undefined;
  });
  protected readonly options = computed(() => {
    const step = this.step();
    if (step.kind === 'choice') return step.options.map(({ label, ask }) => ({ label, more: ask }));
    if (step.kind === 'drive') return step.windows.map(({ label, what }) => ({ label, more: what }));
    return [];
  });
  protected readonly finding = computed(() => {
    const step = this.step();
    return step.kind === 'finding' ? step : undefined;
  });
  protected readonly writeUp = computed(() => {
    const finding = this.finding();
    if (finding === undefined) return [];
    const { cause, correction, customer } = finding;
    return [
      { label: 'Cause', sentences: cause },
      { label: 'Correction', sentences: correction },
      { label: 'For the customer', sentences: customer },
    ].map(({ label, sentences }) => ({
      label,
      sentences: sentences.map(({ text, when }) => ({
        text,
        when: when === undefined ? undefined : conditionWords(when, this.names()),
      })),
    }));
  });
}
