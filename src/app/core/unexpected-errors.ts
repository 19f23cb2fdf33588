import { type ErrorHandler, Injectable, signal } from '@angular/core';

/** What went wrong without anyone expecting it: shown in one place, and written to the console for whoever looks. */
@Injectable({ providedIn: 'root' })
export class UnexpectedErrors implements ErrorHandler {
  private readonly latest = signal<'failed' | 'part-missing' | undefined>(undefined);

  /** `part-missing` when a part of the app could not be fetched; undefined when all is well. */
  readonly shown = this.latest.asReadonly();

  handleError(error: unknown): void {
    this.latest.set(isMissingPart(error) ? 'part-missing' : 'failed');
    // The one place where the console is the right reader: nothing else tells a developer.
    // eslint-disable-next-line no-console
    console.error(error);
  }

  /** The person has seen it. */
  dismiss(): void {
    this.latest.set(undefined);
  }
}

/** Browsers word it differently; all name the dynamically imported module. */
function isMissingPart(error: unknown): boolean {
  const text = error instanceof Error ? error.message : String(error);
  return /dynamically imported module|importing a module script failed|ChunkLoadError/i.test(text);
}
