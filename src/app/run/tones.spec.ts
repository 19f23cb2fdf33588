import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { RunPreferences } from './run-preferences';
import { audioContexts, tones, Tones, type ToneName } from './tones';

/** Counts the oscillators that were started; that they sound is the browser's own. */
function heard(hasSound: boolean) {
  const started: number[] = [];
  const parameter = () => ({ value: 0, setValueAtTime: jest.fn(), linearRampToValueAtTime: jest.fn() });
  const context = {
    currentTime: 2,
    state: 'running',
    destination: {},
    createGain: () => ({ gain: parameter(), connect: (to: unknown) => to }),
    createOscillator: () => ({
      frequency: parameter(),
      connect: (to: unknown) => to,
      start: (at: number) => started.push(at),
      stop: jest.fn(),
    }),
  };
  TestBed.configureTestingModule({
    providers: [
      { provide: audioContexts, useValue: () => context },
      { provide: RunPreferences, useValue: { current: signal({ hasSound, isFromAfar: false }) } },
    ],
  });
  const player = TestBed.inject(Tones);
  return (name: ToneName): number => {
    started.length = 0;
    player.play(name);
    return started.length;
  };
}

describe('Tones', () => {
  it('tells the results apart by their count', () => {
    const play = heard(true);
    const counts = (['in', 'out', 'too-close', 'hold-over', 'limit'] as const).map(play);
    expect(counts).toEqual([2, 3, 1, 4, 10]);
    expect(new Set(counts).size).toBe(counts.length);
  });

  it('rises where it is in band and falls where it is out', () => {
    const pitches = (name: ToneName): readonly number[] => tones[name].map(({ hz }) => hz);
    expect(pitches('in')).toEqual([...pitches('in')].sort((a, b) => a - b));
    expect(pitches('out')).toEqual([...pitches('out')].sort((a, b) => b - a));
  });

  it('is silent when it is switched off, but for a limit', () => {
    const play = heard(false);
    expect((['in', 'out', 'too-close', 'hold-over'] as const).map(play)).toEqual([0, 0, 0, 0]);
    expect(play('limit')).toBe(10);
  });
});
