import { ErrorHandler, inject, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { Dexie, liveQuery } from '#dexie';
import { from } from 'rxjs';

/**
 * A query of the offline store as a signal that follows every change; undefined until it has answered once. A query
 * that fails is reported and gives undefined: an error that reached the live query would end it for good. Signals read
 * inside are not tracked. Call it in an injection context.
 */
export function liveRows<T>(query: () => Promise<T>): Signal<T | undefined> {
  const errors = inject(ErrorHandler);
  const answered = liveQuery(async () => {
    try {
      return await query();
    } catch (error) {
      // A closed database ends every query; that is no fault of this one.
      if (!(error instanceof Dexie.DatabaseClosedError)) errors.handleError(error);
      return undefined;
    }
  });
  return toSignal(from(answered), { initialValue: undefined });
}
