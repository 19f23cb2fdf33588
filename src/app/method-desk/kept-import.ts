import { inject, Injectable } from '@angular/core';
import { SettingsBook } from '../core/settings-book';
import type { FileProblem } from './read-procedure-file';

/** A file that could not become a draft yet, with what is wrong with it. */
export interface KeptImport {
  readonly fileName: string;
  readonly text: string;
  /** Empty where the file only waits for the network. */
  readonly problems: readonly FileProblem[];
  /** Whether the server could not be reached. */
  readonly isWaiting: boolean;
}

const key = 'method-desk-import';

/** Keeps a refused file on this tablet until it is mended or put away, so that nothing is lost. */
@Injectable({ providedIn: 'root' })
export class ImportKeeper {
  private readonly settings = inject(SettingsBook);

  read(): Promise<KeptImport | undefined> {
    return this.settings.read<KeptImport>(key);
  }

  keep(kept: KeptImport): Promise<void> {
    return this.settings.write(key, kept);
  }

  putAway(): Promise<void> {
    return this.settings.forget(key);
  }
}
