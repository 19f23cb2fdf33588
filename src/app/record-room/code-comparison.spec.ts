import type { TroubleCodeEntry } from '../../../procedures/engine';
import { compareCodes } from './code-comparison';

const stored = (code: string): TroubleCodeEntry => ({ code, status: 'stored' });
const pending = (code: string): TroubleCodeEntry => ({ code, status: 'pending' });

describe('codes before and after', () => {
  it('puts what is new first, then what changed, what stayed, and what is gone', () => {
    const before = [stored('P0068'), stored('P0101'), pending('P0171')];
    const after = [stored('P0068'), stored('P0171'), stored('P2279')];
    expect(compareCodes(before, after).map(({ code, change }) => `${code} ${change}`)).toEqual([
      'P2279 new',
      'P0171 changed',
      'P0068 same',
      'P0101 gone',
    ]);
  });

  it('has nothing to say where there was no code and is none', () => {
    expect(compareCodes([], [])).toEqual([]);
  });
});
