import { inject, Injectable, InjectionToken } from '@angular/core';
import type { JudgedResult } from '../../../procedures/document';
import { RunPreferences } from './run-preferences';

/** What sounds: the three results, the end of a hold, and a limit that was exceeded. */
export type ToneName = JudgedResult | 'hold-over' | 'limit';

/** One pulse: pitch in hertz, start and length in milliseconds. */
interface Pulse {
  readonly hz: number;
  readonly atMs: number;
  readonly forMs: number;
}

/**
 * Each differs in contour and count, so that it is told apart without pitch: in band two rising, out of band three
 * falling, too close to call one that stays, the end of a hold four alike, a limit three and two high ones twice over
 * (three, then two, repeated, as alarm standards pulse a high urgency; from memory of IEC 60601-1-8).
 */
export const tones: Readonly<Record<ToneName, readonly Pulse[]>> = {
  in: rowOf([660, 880], 110, 40),
  out: rowOf([520, 440, 350], 130, 50),
  'too-close': rowOf([560], 220, 0),
  'hold-over': rowOf([784, 784, 784, 784], 130, 90),
  limit: [0, 1400].flatMap((start) => [
    ...rowOf([960, 960, 960], 160, 60, start),
    ...rowOf([960, 960], 160, 60, start + 780),
  ]),
};

/** Makes a browser's sound; undefined where it has none. */
export const audioContexts = new InjectionToken<() => AudioContext | undefined>('audioContexts', {
  factory: () => () => (typeof AudioContext === 'undefined' ? undefined : new AudioContext()),
});

/** Plays the short tones. One switch turns all off but the limit's. */
@Injectable({ providedIn: 'root' })
export class Tones {
  private readonly make = inject(audioContexts);
  private readonly preferences = inject(RunPreferences);
  private context: AudioContext | undefined;

  play(name: ToneName): void {
    if (name !== 'limit' && !this.preferences.current().hasSound) return;
    this.context ??= this.make();
    const context = this.context;
    if (context === undefined) return;
    if (context.state === 'suspended') void context.resume();
    for (const pulse of tones[name]) sound(context, pulse);
  }
}

function rowOf(pitches: readonly number[], forMs: number, gapMs: number, startMs = 0): readonly Pulse[] {
  return pitches.map((hz, index) => ({ hz, atMs: startMs + index * (forMs + gapMs), forMs }));
}

/** A triangle has the harmonics that carry through a noisy bay; the short ramps keep it from clicking. */
function sound(context: AudioContext, { hz, atMs, forMs }: Pulse): void {
  const start = context.currentTime + atMs / 1000;
  const end = start + forMs / 1000;
  const oscillator = context.createOscillator();
  const gain = context.createGain();
  oscillator.type = 'triangle';
  oscillator.frequency.value = hz;
  gain.gain.setValueAtTime(0, start);
  gain.gain.linearRampToValueAtTime(0.5, start + 0.012);
  gain.gain.setValueAtTime(0.5, end - 0.02);
  gain.gain.linearRampToValueAtTime(0, end);
  oscillator.connect(gain).connect(context.destination);
  oscillator.start(start);
  oscillator.stop(end);
}
