import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../../procedures/document';
import { renderTemplate } from '../../../../procedures/engine/showing';
import { CautionPanel } from '../../shared/caution-panel';
import { BenchSheet } from '../../shared/practice/bench-sheet';
import { unbroken } from '../../shared/unbroken';
import type { RunView } from '../run-view';
import { cautionsOf, cautionToRead } from '../step-cautions';
import { StepPictureView } from './step-picture-view';

/**
 * The wide side of a step: its cautions above its one sentence, above why, above the picture or whatever is given in
 * its place. A text that is too long scrolls in here; the frame itself never does.
 */
@Component({
  selector: 'bay-wide-side',
  imports: [BenchSheet, CautionPanel, StepPictureView],
  templateUrl: './wide-side.html',
  styleUrl: './wide-side.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WideSide {
  readonly run = input.required<RunView>();
  readonly step = input.required<Step>();
  /** Whether the step's own cautions are left out: the start card shows them one by one. */
  readonly hasOwnCautions = input(false);

  /** Whether the room is needed for what happens now: the sentence stays, why gives way. */
  readonly isUnderWay = input(false);

  protected readonly cautions = computed(() => (this.hasOwnCautions() ? [] : cautionsOf(this.run(), this.step())));
  /** Several that were read in full give the room back: their words stay, their panels go. */
  protected readonly isCompact = computed(
    () => this.isUnderWay() || (this.cautions().length > 1 && cautionToRead(this.run(), this.step()) === undefined),
  );
  /** Whether why and the picture may stand side by side, where the side is wide and low. */
  protected readonly isPictured = computed(
    () => this.why() !== undefined && this.step().picture !== undefined && this.step().kind !== 'compute',
  );
  /** Background for whoever wants it: folded, and out of the way while something goes on. */
  protected readonly notes = computed(() => (this.isUnderWay() ? [] : (this.step().notes ?? [])));
  protected readonly why = computed(() => {
    const { why } = this.step();
    if (why === undefined || this.isUnderWay()) return undefined;
    const { procedure, state } = this.run();
    const text = renderTemplate(procedure, state, why);
    return text === undefined ? undefined : unbroken(text);
  });
}
