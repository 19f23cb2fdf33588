import { effect, inject, Injectable, signal, untracked } from '@angular/core';
import type { Series } from '../../../../procedures/engine/showing';
import { RunJournal } from '../../core/run-journal';
import { RunStore } from '../run-store';
import type { ListenDone, SeriesTaken } from './listen-requests';
import { packSeries, unpackSeries } from './series-blob';

/** Keeps a listen step's series, reads it back, and brings the step to its end. Provided by the run's page. */
@Injectable()
export class ListenFlow {
  private readonly store = inject(RunStore);
  private readonly journal = inject(RunJournal);

  private readonly read = signal<{ readonly sha256: string; readonly series: Series } | undefined>(undefined);

  /** The current step's kept series; undefined while there is none, or while its bytes are being read. */
  readonly kept = this.read.asReadonly();

  constructor() {
    // Towards the store of evidence: after a reload the samples have to be read back before marks can be judged.
    effect(() => {
      const sha256 = this.record()?.sha256;
      if (sha256 !== undefined && untracked(this.read)?.sha256 !== sha256) void this.readBack(sha256);
    });
  }

  /** Keeps a series that came as a file. */
  async take({ series, facts }: SeriesTaken): Promise<boolean> {
    const { command, blob } = await packSeries(series, facts);
    const isKept = await this.store.act(command, { blobs: [blob] });
    if (isKept) this.read.set({ sha256: command.record.sha256, series });
    return isKept;
  }

  /** Keeps what was typed, places the marks, and goes on; stops at the first thing that is refused. */
  async finish({ series, marks }: ListenDone): Promise<void> {
    const isTyped = this.record()?.source !== 'file' && this.record()?.source !== 'simulated';
    // What was typed since it was last kept is kept too.
    const mustKeep = isTyped && this.record()?.samples !== series.timeS.length;
    if (mustKeep && !(await this.keepTyped(series))) return;
    if (this.store.state()?.alarm !== undefined) return;
    for (const [index, mark] of marks.entries()) {
      if (!(await this.store.act({ do: 'mark', ...mark }, { isFollowUp: mustKeep || index > 0 }))) return;
    }
    await this.store.act({ do: 'finish-listening', series }, { isFollowUp: mustKeep || marks.length > 0 });
  }

  private async keepTyped(series: Series): Promise<boolean> {
    const channels = series.channels.map(({ name, unit }) => ({ name, unit, column: 'typed' }));
    const { command, blob } = await packSeries(series, { channels, source: 'typed', skipped: 0, problems: [] });
    return this.store.act(command, { blobs: [blob] });
  }

  private record() {
    const view = this.store.view();
    const step = view?.state.current === undefined ? undefined : view.procedure.step(view.state.current.id);
    const isSeries = step?.kind === 'listen' || step?.kind === 'ramp';
    return isSeries ? view?.state.series[step.name]?.record : undefined;
  }

  private async readBack(sha256: string): Promise<void> {
    const bytes = await this.journal.blob(sha256);
    if (bytes !== undefined) this.read.set({ sha256, series: await unpackSeries(bytes) });
  }
}
