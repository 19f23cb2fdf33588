import { DOCUMENT, inject, Injectable } from '@angular/core';

/**
 * Keeps what is being written to the tablet's store until it is there. The store takes a moment, and a page that goes
 * meanwhile takes an unfinished write with it; what is put here is kept at once.
 */
@Injectable({ providedIn: 'root' })
export class WriteAhead {
  private readonly storage = inject(DOCUMENT).defaultView?.localStorage;

  /** Keeps a JSON value under a key; undefined says that the key is to be forgotten. */
  put(key: string, value: unknown): void {
    try {
      this.storage?.setItem(prefix + key, JSON.stringify({ value }));
    } catch {
      // Full or forbidden: the store itself still gets the value, only not at once.
    }
  }

  /** The store has it. */
  done(key: string): void {
    this.storage?.removeItem(prefix + key);
  }

  /** What a page before could not finish writing. */
  left<T>(key: string): { readonly value: T | undefined } | undefined {
    const text = this.storage?.getItem(prefix + key);
    return text === null || text === undefined ? undefined : (JSON.parse(text) as { value: T | undefined });
  }
}

const prefix = 'being-written:';
