import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { BandGauge } from '../shared/band-gauge';
import { CodesCompared } from './codes-compared';
import { PassageTitle } from './passage-title';
import { clockTime } from '../core/time-words';
import type { SeriesLoad } from './series-load';
import { SeriesView } from './series-view';
import type { Passage } from './story-line';
import { rowsOf } from './story-rows';
import { WayTaken } from './way-taken';

/** A run as it happened: a table with a body for each claim of a step. */
@Component({
  selector: 'bay-story-table',
  imports: [BandGauge, CodesCompared, PassageTitle, SeriesView, WayTaken],
  templateUrl: './story-table.html',
  styleUrl: './story-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoryTable {
  readonly passages = input.required<readonly Passage[]>();
  /** The loaded series by the hash of their bytes. */
  readonly series = input<ReadonlyMap<string, SeriesLoad>>(new Map());

  protected readonly clock = clockTime;
  protected readonly cautionsText = (count: number): string =>
    count === 1 ? '1 caution acknowledged' : `${count} cautions acknowledged`;
  protected readonly entries = computed(() => this.passages().map((passage) => ({ passage, rows: rowsOf(passage) })));
}
