import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import { isUnit } from '../../../../procedures/calculations/for-a-run';
import { shownUnit, type Series } from '../../../../procedures/engine/showing';
import { RampPlot } from '../../shared/ramp-plot';
import type { PlotMark } from '../../shared/ramp-plot-options';
import { HandSide } from '../frame/hand-side';
import { StepPictureView } from '../frame/step-picture-view';
import { WideSide } from '../frame/wide-side';
import { practiceRamp } from '../practice-ramp';
import { StepEntry } from '../step-entry';
import { FoundControls } from './found-controls';
import { FileTaking } from './file-taking';
import { LiveControls } from './live-controls';
import { MarkControls } from './mark-controls';
import { risesOf, seriesOfTakes } from './live-series';
import { plotMarks } from './plot-marks';
import type { ListenDone, SeriesTaken } from './listen-requests';

/**
 * A logged ramp: typed live, one tap a point, or taken from a file. One that is listened to has the marks `noise begins`
 * and `noise stops`, and what they give is judged while they are moved; of any other what is found in it is shown.
 */
@Component({
  selector: 'bay-listen-entry',
  imports: [FileTaking, FoundControls, HandSide, LiveControls, MarkControls, RampPlot, StepPictureView, WideSide],
  templateUrl: './listen-entry.html',
  styleUrl: './listen-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ListenEntry extends StepEntry<'listen' | 'ramp'> {
  /** The series that was kept with the step, once its bytes are read. */
  readonly kept = input<Series>();
  /** The run's monotonic time, milliseconds. */
  readonly elapsed = input.required<() => number>();
  /** A log that the practice bench offers: what it is called, and its bytes. */
  protected readonly offered = computed(() => practiceRamp(this.run().header));
  readonly seriesTaken = output<SeriesTaken>();
  readonly finished = output<ListenDone>();

  /** Whether a file is being chosen; at another step or round none is yet. */
  protected readonly taking = linkedSignal({
    source: () => this.run().state.current?.claimedSeq,
    computation: () => false,
  });
  /** What was refused, until what it was about is changed. */
  protected readonly standing = linkedSignal(() => this.problem());
  /** The marks as they are being moved, before they are recorded. */
  protected readonly moved = linkedSignal<number, readonly PlotMark[] | undefined>({
    source: () => this.run().state.seq,
    computation: () => undefined,
  });

  protected readonly record = computed(() => this.run().state.series[this.step().name]?.record);
  /** Whether the series came as a file; a typed one is kept only when the step is finished. */
  protected readonly isFromFile = computed(() => {
    const source = this.record()?.source;
    return source !== undefined && source !== 'typed';
  });
  protected readonly series = computed<Series>(() =>
    this.isFromFile()
      ? (this.kept() ?? { timeS: [], channels: [] })
      : seriesOfTakes(this.step(), this.run().state.current?.takes ?? {}),
  );
  /** As it is drawn: absolute pressures by how far they rose, on one scale with the gauge. */
  protected readonly drawn = computed(() => risesOf(this.series(), this.step()));
  protected readonly hasPlot = computed(() => this.series().timeS.length > 1);
  protected readonly marks = computed(() => plotMarks(this.run().state, this.step()));
  protected readonly names = computed(() =>
    Object.fromEntries(
      this.step().channels.map(({ name, label, sense }) => [name, sense === 'absolute' ? `${label}, risen by` : label]),
    ),
  );
  /** `towards 10 kPa, never over 34.5`: the target and the limit are told apart. */
  protected readonly aim = computed(() => {
    const step = this.step();
    const gauge = step.channels.find(({ name }) => name === 'gauge');
    const unit = gauge === undefined || !isUnit(gauge.unit) ? 'kPa' : gauge.unit;
    return { label: gauge?.label ?? 'Gauge', unit: shownUnit(unit), target: step.target, ceiling: this.ceiling() };
  });
  private readonly ceiling = computed(() => {
    const limit = this.run().procedure.document.limits.find(({ of }) => of.includes('gauge'));
    return limit === undefined ? undefined : /(\d+(?:\.\d+)?)/.exec(limit.holds)?.[1];
  });

  /** What was refused on one page is not said again on the other. */
  protected show(page: 'typing' | 'file'): void {
    this.taking.set(page === 'file');
    this.standing.set(undefined);
  }
}
