import type { NamedValue, RunState } from '../../../procedures/engine';
import { toneAfter } from './run-tones';

const judged = (name: string, seq: number, result: 'in' | 'out' | 'too-close' | undefined): NamedValue =>
  ({ name, seq, ...(result === undefined ? {} : { judgement: { result, source: '' } }) }) as unknown as NamedValue;
const state = (seq: number, values: readonly NamedValue[], alarmSeq?: number): RunState =>
  ({
    seq,
    values: Object.fromEntries(values.map((value) => [value.name, value])),
    alarm: alarmSeq === undefined ? undefined : { seq: alarmSeq },
  }) as unknown as RunState;

describe('toneAfter', () => {
  it('is silent where nothing was judged', () => {
    expect(toneAfter(state(4, []), state(6, [judged('a', 5, undefined)]))).toBeUndefined();
  });

  it('sounds the worst of what was judged now', () => {
    const after = state(8, [judged('a', 5, 'in'), judged('b', 6, 'out'), judged('c', 7, 'too-close')]);
    expect(toneAfter(state(4, []), after)).toBe('out');
  });

  it('does not sound again for what was judged before', () => {
    const before = state(5, [judged('a', 5, 'out')]);
    expect(toneAfter(before, state(8, [judged('a', 5, 'out'), judged('b', 7, 'in')]))).toBe('in');
  });

  it('sounds a limit before all, and once', () => {
    const exceeded = state(8, [judged('a', 7, 'in')], 8);
    expect(toneAfter(state(4, []), exceeded)).toBe('limit');
    expect(toneAfter(exceeded, state(9, [judged('a', 7, 'in')], 8))).toBeUndefined();
  });
});
