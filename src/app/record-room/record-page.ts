import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, input, untracked } from '@angular/core';
import { RouterLink } from '@angular/router';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { tabletWords } from '../core/tablet-words';
import { LoadProblem } from '../shared/load-problem';
import { unbroken } from '../shared/unbroken';
import { ResultMark } from '../shared/result-mark';
import { TopBar } from '../shared/top-bar';
import { EventList } from './event-list';
import { RecordStore } from './record-store';
import { RecordSummary } from './record-summary';
import { SameHalf } from './same-half';
import { StoryTable } from './story-table';
import { WriteUpView } from './write-up-view';

/** One record, whole: who did what to which car, how it was judged, and whether anybody changed it since. */
@Component({
  selector: 'bay-record-page',
  imports: [
    EventList,
    LoadProblem,
    NgTemplateOutlet,
    RecordSummary,
    ResultMark,
    RouterLink,
    SameHalf,
    StoryTable,
    TopBar,
    WriteUpView,
  ],
  templateUrl: './record-page.html',
  styleUrl: './record-page.css',
  providers: [RecordStore],
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordPage {
  protected readonly store = inject(RecordStore);
  private readonly offline = inject(OfflineStore);

  /** Of the address. */
  readonly runId = input.required<string>();

  private readonly people = liveRows(() => this.offline.people.toArray());

  protected readonly names = computed(
    () => new Map((this.people() ?? []).map(({ id, displayName }) => [id, displayName])),
  );
  /** The tablets that wrote, by their labels where the server has them. */
  protected readonly tablets = computed(() => {
    const record = this.store.record();
    const devices = [...new Set((record?.events ?? []).map(({ device }) => device))];
    return devices.map((device) => tabletWords(record?.tablets.find(({ id }) => id === device)?.label ?? device));
  });
  protected readonly replay = computed(() => {
    const retold = this.store.retold();
    return retold?.ok === true ? retold : undefined;
  });
  protected readonly refusal = computed(() => {
    const retold = this.store.retold();
    return retold?.ok === false ? retold.why : undefined;
  });
  /** The last event that could be replayed, where the replay broke off. */
  protected readonly toldThrough = computed(() => {
    const end = this.replay()?.story.brokenOff;
    return end === undefined ? undefined : end.seq - 1;
  });
  protected readonly stationKpa = computed(() => {
    const station = this.replay()?.state.values['stationPressure'];
    return station === undefined ? undefined : station.value / 1000;
  });
  protected readonly finding = computed(() => {
    const replay = this.replay();
    const step = replay?.state.finding === undefined ? undefined : replay.procedure.step(replay.state.finding);
    if (replay === undefined || step?.kind !== 'finding') return undefined;
    const passage = [...replay.story.passages].reverse().find((candidate) => candidate.step === step);
    const said = passage?.lines.find((line) => line.kind === 'said' && line.type === 'finding-reached');
    return {
      result: step.result,
      title: step.title,
      verdict: said?.kind === 'said' && said.words ? unbroken(said.words) : undefined,
    };
  });

  constructor() {
    // The store lives outside the template: it follows the address.
    effect(() => {
      const runId = this.runId();
      untracked(() => this.store.show(runId));
    });
  }

  /** Brings the claim that holds an event into sight. */
  protected goTo(seq: number): void {
    const passages = this.replay()?.story.passages ?? [];
    const passage = [...passages].reverse().find((candidate) => candidate.seq <= seq);
    const element = passage && document.getElementById(`event-${passage.seq}`);
    element?.scrollIntoView({ block: 'center' });
    element?.focus({ preventScroll: true });
  }
}
