import { hotIdleWhistle } from '../shared/practice/hot-idle-whistle';
import { compiledLibraryProcedure, walkScenario } from '../shared/testing/walk-scenario';
import { wordOfChain } from './chain-word';

describe('the word on a record’s chain', () => {
  const { header, events } = walkScenario(compiledLibraryProcedure(), hotIdleWhistle, {
    choices: {},
    until: 'codes-before',
  });
  const count = events.length;
  const signed = (seq: number, head = events[seq - 1]?.hash ?? '') => ({
    branch: 'main',
    seq,
    head,
    at: new Date(2026, 11, 2, 11, 4).getTime(),
    signature: 'c2ln',
  });

  it('says that it is whole and when it was countersigned', () => {
    expect(wordOfChain(header, events, [signed(count)])).toEqual({
      isWhole: true,
      text: `Chain whole · ${count} events · countersigned 11:04`,
      detail: undefined,
    });
  });

  it('says what is not countersigned yet', () => {
    expect(wordOfChain(header, events, []).text).toBe(`Chain whole · ${count} events · not countersigned yet`);
    expect(wordOfChain(header, events, [signed(count - 2)]).detail).toBe(
      'The newest 2 events are not countersigned yet.',
    );
  });

  it('names the event that was changed', () => {
    const changed = events.map((event, index) => (index === 4 ? { ...event, at: event.at + 1 } : event));
    expect(wordOfChain(header, changed, [])).toEqual({
      isWhole: false,
      text: 'Chain broken at event 5',
      detail: 'Event 5 was changed after it was written.',
    });
  });

  it('names the event that is missing', () => {
    const shortened = events.filter((_, index) => index !== 2);
    expect(wordOfChain(header, shortened, []).detail).toBe('Event 3 is missing: the next one is numbered 4.');
  });

  it('does not take a chain that was rewritten as a whole for the countersigned one', () => {
    const word = wordOfChain(header, events, [signed(3, 'f'.repeat(64))]);
    expect(word).toMatchObject({ isWhole: false, text: 'Chain differs from the countersigned one' });
    expect(word.detail).toContain('countersigned another event 3 on 2 Dec 2026, 11:04');
  });

  it('leaves the countersignatures of another tail alone', () => {
    const other = { ...signed(count, 'f'.repeat(64)), branch: 'fork' };
    expect(wordOfChain(header, events, [signed(count), other]).isWhole).toBe(true);
  });
});
