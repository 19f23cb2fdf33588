import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../procedures/document';
import { RampPlot } from '../shared/ramp-plot';
import type { SeriesLoad } from './series-load';
import type { SeriesLine } from './story-line';

/** A kept series: where it came from, the ramp with its marks, and what its reader could not make sense of. */
@Component({
  selector: 'bay-series-view',
  imports: [RampPlot],
  templateUrl: './series-view.html',
  styleUrl: './series-view.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeriesView {
  readonly line = input.required<SeriesLine>();
  readonly step = input<Step>();
  /** Absent until someone starts to fetch it. */
  readonly load = input<SeriesLoad>();

  protected readonly series = computed(() => {
    const load = this.load();
    return load?.status === 'there' ? load.series : undefined;
  });
  protected readonly why = computed(() => {
    const load = this.load();
    return load?.status === 'failed' ? load.why : '';
  });
  protected readonly origin = computed(() => {
    const { samples, durationS, fileName, source } = this.line().record;
    const from = fileName ?? (source === 'typed' ? 'typed points' : source === 'simulated' ? 'simulated' : 'a file');
    return `${samples} samples over ${Math.round(durationS)} s, ${from}`;
  });
  protected readonly marks = computed(() => {
    const { marks } = this.line();
    const begins = marks['noise-begins'];
    const stops = marks['noise-stops'];
    return [
      ...(begins === undefined ? [] : [{ label: 'noise begins', timeS: begins.timeS, isMain: false }]),
      ...(stops === undefined ? [] : [{ label: 'noise stops', timeS: stops.timeS, isMain: true }]),
    ];
  });
  protected readonly names = computed(() => {
    const step = this.step();
    const channels = step?.kind === 'listen' ? step.channels : [];
    return Object.fromEntries(channels.map((channel) => [channel.name, channel.label]));
  });
}
