import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { previewDecision, previewResults } from '../../../../procedures/engine';
import { resultsOf, shownUnit } from '../../../../procedures/engine/showing';
import { unbroken } from '../../shared/unbroken';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { JudgedLine } from '../readings/judged-line';
import { StepEntry } from '../step-entry';
import { formulaParts } from './formula-words';
import { waySentence } from './way-sentence';

/**
 * Compares what was measured: the quantities that decide, each with its uncertainty and band, what follows from them in
 * the author's words, and every result with its formula and the numbers put in.
 */
@Component({
  selector: 'bay-compute-entry',
  imports: [BigAction, HandSide, JudgedLine, WideSide],
  templateUrl: './compute-entry.html',
  styleUrl: './compute-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComputeEntry extends StepEntry<'compute'> {
  private readonly decision = computed(() => previewDecision(this.run().procedure, this.run().state));
  private readonly values = computed(() => previewResults(this.run().procedure, this.run().state));

  /** What decides, the quantities of the rule that holds first; then what the step computes and judges. */
  protected readonly deciding = computed(() => {
    const judged = this.values().filter(({ judgement }) => judgement !== undefined);
    const read = this.decision()?.deciding ?? [];
    return [...read, ...judged.filter(({ name }) => read.every((value) => value.name !== name))];
  });
  protected readonly results = computed(() =>
    resultsOf(this.step()).map(({ name, label, is }) => {
      const value = this.values().find((candidate) => candidate.name === name);
      return {
        name,
        label,
        parts: formulaParts(this.run(), is),
        isJudged: value?.judgement !== undefined,
        figure: value === undefined ? undefined : `${value.text} ${shownUnit(value.unit)}`.trim(),
      };
    }),
  );
  protected readonly missing = computed(() => this.results().filter(({ figure }) => figure === undefined));
  protected readonly follows = computed(() => {
    const way = this.decision()?.way;
    if (way === undefined) return undefined;
    return { because: unbroken(way.because), to: waySentence(this.run().procedure, way) };
  });
}
