import { ChangeDetectionStrategy, Component, computed } from '@angular/core';
import { previewDecision, previewTaken } from '../../../../procedures/engine';
import { renderTemplate } from '../../../../procedures/engine/showing';
import { ResultMark } from '../../shared/result-mark';
import { unbroken } from '../../shared/unbroken';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { JudgedLine } from '../readings/judged-line';
import { StepEntry } from '../step-entry';
import { waySentence } from './way-sentence';

/**
 * The called procedure was gone through: what it found, what is taken over from it, each judged by the band that it has
 * here, and what follows.
 */
@Component({
  selector: 'bay-call-entry',
  imports: [BigAction, HandSide, JudgedLine, ResultMark, WideSide],
  templateUrl: './call-entry.html',
  styleUrl: './call-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CallEntry extends StepEntry<'call'> {
  /** The called procedure's own finding, with its verdict in words. */
  protected readonly found = computed(() => {
    const { procedure, state } = this.run();
    const finding = state.verdict === undefined ? undefined : procedure.step(state.verdict);
    if (finding?.kind !== 'finding' || procedure.blockOf(finding.id)?.call !== this.step().id) return undefined;
    const verdict = renderTemplate(procedure, state, finding.verdict) ?? finding.title;
    return { result: finding.result, verdict: unbroken(verdict) };
  });
  protected readonly taken = computed(() => previewTaken(this.run().procedure, this.run().state));
  /** What was to be taken over and was not measured there. */
  protected readonly missing = computed(() =>
    this.step().takes.filter(({ name }) => this.taken().every((value) => value.name !== name)),
  );
  protected readonly follows = computed(() => {
    const way = previewDecision(this.run().procedure, this.run().state)?.way;
    if (way === undefined) return undefined;
    return { because: unbroken(way.because), to: waySentence(this.run().procedure, way) };
  });
}
