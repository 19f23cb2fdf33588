import { composeWriteUp } from '.';
import { atListen, procedure, record, series } from './testing/small-walks';

describe('the write-up', () => {
  it('is composed from what was measured, each number with its step', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'mark', mark: 'noise-stops', timeS: 30, by: 'tap' },
      { do: 'finish-listening', series },
      { do: 'restore', item: 'dipstick' },
    );
    const { concern, cause, correction } = composeWriteUp(procedure, walk.state);
    expect(concern.text).toBe(
      'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
    );
    expect(cause.text).toMatch(
      /^The valve seals at \d\.\d \u00b1 0\.\d kPa \(step 5\)\. The noise stopped at .* \(step 5\)\. Manifold pressure read 94\.2 \u00b1 0\.6 kPa \(step 3\)\.$/,
    );
    expect(correction.text).toBe('None needed. Tested by Small check, version 1 with G-12, S-3.');
  });

  it('tells what was edited from what was composed', () => {
    const walk = atListen().do(
      { do: 'stop', reason: '' },
      { do: 'leave-stop', how: 'not-completed', reason: 'The hose {split}' },
      { do: 'restore', item: 'dipstick' },
    );
    const { concern, cause, correction, customer } = composeWriteUp(procedure, walk.state);
    expect(cause.text).toContain('The test was stopped at step 5, Raise slowly and listen: the hose {split}.');
    expect(cause.sentences.flatMap(({ cites }) => cites)).toContainEqual(
      expect.objectContaining({ step: 'listen', stepNumber: '5' }),
    );
    walk.do({
      do: 'keep-write-up',
      concern: concern.text,
      cause: `${cause.text} Hose split.`,
      correction: correction.text,
      customer: customer.text,
    });
    expect(walk.state.writeUp?.edited).toEqual(['cause']);
  });
});
