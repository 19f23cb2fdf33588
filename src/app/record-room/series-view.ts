import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../procedures/document';
import { RampPlot } from '../shared/ramp-plot';
import { marksShown } from './marks-shown';
import type { SeriesLoad } from './series-load';
import type { SeriesLine } from './story-line';
import { channelLabels } from './typed-points';
import { lowerFirst } from '../../../procedures/engine/showing';

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
  /** The air of the place, kilopascals; absent where it was not known. */
  readonly stationKpa = input<number>();
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
  protected readonly marks = computed(() => marksShown(this.line().marks));
  /** What the lines are, in words: the drawing alone tells them apart by dashes. */
  protected readonly legend = computed(() => {
    const names = this.names();
    const channels = this.series()?.channels ?? [];
    const pressures = channels.filter(({ name }) => name !== 'sound');
    const lines = pressures.map(
      ({ name }, index) => `${dashes[index] ?? 'dotted'}: ${lowerFirst(names[name] ?? name)}`,
    );
    const station = this.stationKpa();
    const above = station === undefined ? '' : `, above the air of the place (${station.toFixed(1)} kPa)`;
    const sound = channels.some(({ name }) => name === 'sound') ? ['below them: the level of the sound'] : [];
    return lines.length === 0 ? '' : [`${capital(lines.join(', '))}${above}`, ...sound].join('; ');
  });
  protected readonly names = computed(() => channelLabels(this.step()));
}

const dashes = ['solid', 'dashed', 'dotted'];

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
