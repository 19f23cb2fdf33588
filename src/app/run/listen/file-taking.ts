import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { Channel } from '../../../../procedures/document';
import { PrimaryButton } from '../primary-action';
import type { RunProblem } from '../run-view';
import type { StepOf } from '../step-entry';
import type { SeriesTaken } from './listen-requests';
import {
  columnsFor,
  guessColumns,
  readScanFile,
  refusedBySize,
  seriesOf,
  skippedWords,
  type ColumnChoice,
  type ScanFile,
} from './scan-file';

/** Taking the scan tool's log: chosen, looked at with its columns and with what was skipped, then kept. */
@Component({
  selector: 'bay-file-taking',
  imports: [PrimaryButton],
  templateUrl: './file-taking.html',
  styleUrl: './file-taking.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileTaking {
  readonly step = input.required<StepOf<'listen' | 'ramp'>>();
  /** A log that the practice bench offers. */
  readonly offered = input<{ readonly fileName: string; readonly path: string }>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly seriesTaken = output<SeriesTaken>();
  /** Another file or another column was chosen: what was refused before is no longer about what stands here. */
  readonly changed = output();
  readonly left = output();

  protected readonly file = signal<ScanFile | undefined>(undefined);
  protected readonly isReading = signal(false);
  protected readonly choice = signal<ColumnChoice>({});
  /** Counts the files, so that a slow one does not take the place of a later one. */
  private taken = 0;
  protected readonly log = computed(() => {
    const file = this.file();
    return file?.ok === true ? file : undefined;
  });
  protected readonly refusal = computed(() => {
    const file = this.file();
    return file !== undefined && !file.ok ? file.message : undefined;
  });
  protected readonly rows = computed(() => {
    const log = this.log()?.log;
    if (log === undefined) return [];
    return this.step().channels.map((channel) => ({ channel, columns: columnsFor(channel, log) }));
  });
  protected readonly missing = computed(() =>
    this.step().channels.filter(({ name, needed }) => needed && this.choice()[name] === undefined),
  );
  protected readonly durationS = computed(() => this.log()?.log.timeS.at(-1) ?? 0);
  protected readonly skipped = computed(() => {
    const log = this.log()?.log;
    return log === undefined ? [] : skippedWords(log);
  });

  protected async take(input: HTMLInputElement): Promise<void> {
    const file = input.files?.[0];
    input.value = '';
    if (file === undefined) return;
    const refused = refusedBySize(file.name, file.size);
    if (refused === undefined) return this.read(file.name, () => file.arrayBuffer());
    this.clear();
    this.file.set({ ok: false, message: refused });
  }

  protected async takeOffered({ fileName, path }: { fileName: string; path: string }): Promise<void> {
    await this.read(fileName, async () => (await fetch(path)).arrayBuffer());
  }

  protected choose(channel: Channel, column: string): void {
    const index = column === '' ? undefined : Number(column);
    this.choice.update((choice) => ({ ...choice, [channel.name]: index }));
    this.changed.emit();
  }

  protected keep(): void {
    const file = this.log();
    if (file === undefined) return;
    const series = seriesOf(this.step(), file.log, this.choice());
    this.seriesTaken.emit({
      series,
      facts: {
        channels: series.channels.map(({ name, unit }) => ({
          name,
          unit,
          column: file.log.channels[this.choice()[name] ?? -1]?.name ?? name,
        })),
        source: this.offered() === undefined ? 'file' : 'simulated',
        fileName: file.fileName,
        skipped: file.log.problems.length,
        problems: this.skipped(),
      },
    });
  }

  private async read(fileName: string, bytes: () => Promise<ArrayBuffer>): Promise<void> {
    const mine = this.clear();
    this.isReading.set(true);
    const file = await fileFrom(fileName, bytes);
    if (mine !== this.taken) return;
    this.isReading.set(false);
    this.file.set(file);
    if (file.ok) this.choice.set(guessColumns(this.step(), file.log));
  }

  /** Takes away the file that stood here and what was said about it; gives the number of the one that comes. */
  private clear(): number {
    this.file.set(undefined);
    this.isReading.set(false);
    this.changed.emit();
    this.taken += 1;
    return this.taken;
  }
}

async function fileFrom(fileName: string, bytes: () => Promise<ArrayBuffer>): Promise<ScanFile> {
  try {
    return readScanFile(fileName, new Uint8Array(await bytes()));
  } catch (error) {
    // NotReadableError and its like: the file was moved or its medium taken out meanwhile. TypeError: not fetched.
    if (!(error instanceof DOMException || error instanceof TypeError)) throw error;
    return { ok: false, message: `${fileName} could not be read. Choose it again.` };
  }
}
