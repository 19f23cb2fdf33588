import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../procedures/document';
import { RampPlot } from '../shared/ramp-plot';
import { marksShown } from './marks-shown';
import type { PointsLine } from './story-line';
import { channelLabels, pointTexts, seriesOfPoints } from './typed-points';

/** Points that were typed into a ramp and do not count: their curve with the marks, and each of them on demand. */
@Component({
  selector: 'bay-points-view',
  imports: [RampPlot],
  template: `
    <p>
      <b>{{ title() }}</b>&ngsp;<span class="muted">{{ why() }}</span>
    </p>
    <div class="plot">
      <bay-ramp-plot [series]="series()" [marks]="marks()" [names]="names()" [stationKpa]="stationKpa()" />
    </div>
    <details>
      <summary>Each point</summary>
      <table>
        <thead>
          <tr>
            <th scope="col">At</th>
            <th scope="col">What</th>
            <th scope="col">Value</th>
            <th scope="col"><span class="visually-hidden">Whether it was taken back</span></th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.seq) {
            <tr>
              <td class="num">{{ row.time }}</td>
              <td>{{ row.label }}</td>
              <td class="num">{{ row.value }}</td>
              <td class="muted">{{ row.isTakenBack ? 'taken back' : '' }}</td>
            </tr>
          }
        </tbody>
      </table>
    </details>
  `,
  styleUrls: ['./series-view.css', './points-view.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PointsView {
  readonly line = input.required<PointsLine>();
  readonly step = input<Step>();
  /** Whether the step was left behind. */
  readonly isLeft = input(false);
  /** The air of the place, kilopascals; absent where it was not known. */
  readonly stationKpa = input<number>();

  protected readonly title = computed(() => {
    const count = this.line().points.length;
    return count === 1 ? '1 point typed' : `${count} points typed`;
  });
  protected readonly why = computed(() => {
    if (this.line().points.every(({ isTakenBack }) => isTakenBack)) return 'taken back: they do not count';
    return this.isLeft() ? 'left behind: they do not count' : 'no series was kept of them: they do not count';
  });
  protected readonly series = computed(() => seriesOfPoints(this.line().points));
  protected readonly marks = computed(() => marksShown(this.line().marks));
  protected readonly names = computed(() => channelLabels(this.step()));
  protected readonly rows = computed(() =>
    this.line().points.map((point) => ({
      seq: point.seq,
      label: this.names()[point.channel] ?? point.channel,
      isTakenBack: point.isTakenBack,
      ...pointTexts(point),
    })),
  );
}
