import { InjectionToken } from '@angular/core';
import { v7 } from 'uuid';

/** The device's clock: milliseconds since 1970. */
export const clock = new InjectionToken<() => number>('clock', { factory: () => () => Date.now() });

/** Milliseconds that only ever rise, from an arbitrary start; nobody can set them. */
export const monotonicClock = new InjectionToken<() => number>('monotonicClock', {
  factory: () => () => performance.now(),
});

/** Makes a new UUIDv7. */
export const newId = new InjectionToken<() => string>('newId', { factory: () => () => v7() });

/** A number from 0 up to but not 1: the chance in a retry's delay. */
export const chance = new InjectionToken<() => number>('chance', { factory: () => () => Math.random() });
