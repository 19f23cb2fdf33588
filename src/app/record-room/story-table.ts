import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { BandGauge } from '../shared/band-gauge';
import { CodesCompared } from './codes-compared';
import { PassageTitle } from './passage-title';
import { clockTime } from '../core/time-words';
import type { PhotoLoad } from './photo-load';
import { PhotoView } from './photo-view';
import { PointsView } from './points-view';
import type { SeriesLoad } from './series-load';
import { SeriesView } from './series-view';
import type { Passage } from './story-line';
import { rowsOf, type StoryRow } from './story-rows';
import { WayTaken } from './way-taken';

/** A run as it happened: a table with a body for each claim of a step. */
@Component({
  selector: 'bay-story-table',
  imports: [BandGauge, CodesCompared, PassageTitle, PhotoView, PointsView, SeriesView, WayTaken],
  templateUrl: './story-table.html',
  styleUrl: './story-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoryTable {
  readonly passages = input.required<readonly Passage[]>();
  /** The loaded series by the hash of their bytes. */
  readonly series = input<ReadonlyMap<string, SeriesLoad>>(new Map());

  /** The loaded photos by the hash of their bytes. */
  readonly photos = input<ReadonlyMap<string, PhotoLoad>>(new Map());
  /** Person's id -> how they are called. */
  readonly names = input<ReadonlyMap<string, string>>(new Map());

  /** The air of the place, kilopascals; absent where it was not known. */
  readonly stationKpa = input<number>();

  protected readonly clock = clockTime;
  protected readonly cautionsText = (count: number): string =>
    count === 1 ? '1 caution acknowledged' : `${count} cautions acknowledged`;
  protected readonly entries = computed(() =>
    this.passages().map((passage) => {
      const rows = rowsOf(passage);
      return { passage, rows, times: timesOf(rows) };
    }),
  );
}

/** The time of day of each row, once a minute: what happened in the same minute has none of its own. */
function timesOf(rows: readonly StoryRow[]): readonly string[] {
  const times = rows.map((row) => clockTime(row.kind === 'line' ? row.line.at : row.at));
  return times.map((time, index) => (time === times[index - 1] ? '' : time));
}
