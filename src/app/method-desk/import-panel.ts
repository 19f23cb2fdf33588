import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { KeptImport } from './kept-import';

/** A file that a person chose, as text. */
export interface ChosenFile {
  readonly fileName: string;
  readonly text: string;
}

/** Where a procedure file is brought in; a file that cannot become a draft stays here with what is to be mended. */
@Component({
  selector: 'bay-import-panel',
  templateUrl: './import-panel.html',
  styleUrl: './import-panel.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPanel {
  /** A file that waits to be mended or sent. */
  readonly unfinished = input<KeptImport>();
  readonly isBusy = input(false);

  readonly chosen = output<ChosenFile>();
  readonly tryAgain = output<void>();
  readonly putAway = output<void>();
  /** The file could not be read from the disk. */
  readonly unreadable = output<string>();

  protected readonly isOver = signal(false);
  protected readonly summary = computed(() => {
    const problems = this.unfinished()?.problems.length ?? 0;
    return problems === 1 ? '1 problem must be mended' : `${problems} problems must be mended`;
  });

  protected async take(event: Event): Promise<void> {
    const field = event.target;
    if (!(field instanceof HTMLInputElement)) return;
    await this.read(field.files?.[0]);
    // The same file, mended, can be chosen again.
    field.value = '';
  }

  protected async drop(event: DragEvent): Promise<void> {
    event.preventDefault();
    this.isOver.set(false);
    await this.read(event.dataTransfer?.files[0]);
  }

  protected hover(event: DragEvent, isOver: boolean): void {
    event.preventDefault();
    this.isOver.set(isOver);
  }

  private async read(file: File | undefined): Promise<void> {
    if (file === undefined) return;
    try {
      this.chosen.emit({ fileName: file.name, text: await file.text() });
    } catch (error) {
      // The browser fails with NotReadableError when the file was moved or changed meanwhile.
      if (!(error instanceof DOMException)) throw error;
      this.unreadable.emit(file.name);
    }
  }
}
