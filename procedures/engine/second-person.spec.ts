import { inPartTest, partWith } from './testing/outer-walk';
import type { RunWalk } from './testing/run-walk';

const atRelease = (): RunWalk => partWith(inPartTest(), '5.0').do({ do: 'confirm' });

describe('a step that waits for somebody else', () => {
  it('is not done before the second person looked and the lead released it', () => {
    const walk = atRelease();
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      message: 'A second person looks first: The supply is off.',
    });
    walk.do({ do: 'verify', by: 'brandt' });
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      message: 'The lead lets the run go on from here, on this: The plug is secured.',
    });
    walk.do({ do: 'release', role: 'lead', evidence: 'Secured with two clamps.' }, { do: 'confirm' });
    expect(walk.state.current?.id).toBe('hold');
  });

  it('is not verified by whoever does it', () => {
    expect(atRelease().ask({ do: 'verify', by: 'okafor' })).toMatchObject({ ok: false, code: 'same-person' });
  });

  it('is released on words, by a lead or a manager', () => {
    expect(atRelease().ask({ do: 'release', role: 'lead', evidence: ' ' })).toMatchObject({
      ok: false,
      field: 'evidence',
    });
    expect(atRelease().ask({ do: 'release', role: 'manager', evidence: 'Seen.' })).toMatchObject({ ok: true });
  });

  it('asks for both again when it is taken again', () => {
    const walk = atRelease().do(
      { do: 'verify', by: 'brandt' },
      { do: 'release', role: 'lead', evidence: 'Seen.' },
      { do: 'redo', step: 'lead', reason: 'moved' },
    );
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'verify-first' });
  });
});
