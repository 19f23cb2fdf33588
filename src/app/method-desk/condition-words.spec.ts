import { crankcaseValveSeal } from '../../../procedures/library';
import { conditionWords, nameBook } from './condition-words';

describe('a condition in words', () => {
  const names = nameBook(crankcaseValveSeal);

  it.each([
    ['tooClose(manifoldPressure)', 'manifold pressure is too close to call'],
    ['noiseStopped and inBand(sealPoint)', 'the noise stopped and seal point is in its band'],
    [
      'outOfBand(manifoldPressure) and outOfBand(boostPressure)',
      'manifold pressure is out of its band and boost pressure is out of its band',
    ],
    ['measured(stationPressure)', 'air of the place was measured'],
    ['coolantAtMark < warmHolds', 'coolant when the noise was heard < coolant at least, while it is listened to'],
    ['airAtInletVent and pulseShuts', '‘At the inlet-side vent’ was chosen and ‘It clicks shut’ was chosen'],
    ['doesNotSeal or placeNotFound', 'heading for ‘Does not seal’ or heading for ‘Not completed, no place found’'],
    ['gauge <= 34.5 kPa', 'gauge ≤ 34.5 kPa'],
    ['cold', 'the cold half'],
  ])('%s', (source, words) => {
    expect(conditionWords(source, names)).toBe(words);
  });

  it('keeps a name that the document does not have, so that a mistake stays visible', () => {
    expect(conditionWords('inBand(nosuch) and other > 3 kPa', names)).toBe('nosuch is in its band and other > 3 kPa');
  });
});
