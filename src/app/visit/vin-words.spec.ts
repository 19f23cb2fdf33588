import { caretIn, groupVin, tidyVin } from './vin-text';
import { vinVerdict } from './vin-words';

describe('VIN words', () => {
  it('groups what is typed into its three sections', () => {
    expect(tidyVin(' 1zz-bt4ck4 lr204817 99')).toBe('1ZZBT4CK4LR204817');
    expect(['', '1Z', '1ZZB', '1ZZBT4CK4', '1ZZBT4CK4LR204817'].map(groupVin)).toEqual([
      '',
      '1Z',
      '1ZZ B',
      '1ZZ BT4CK4',
      '1ZZ BT4CK4 LR204817',
    ]);
  });

  it.each([
    [0, 0],
    [3, 3],
    [4, 5],
    [10, 12],
    [17, 19],
  ])('keeps the caret behind %i characters at %i', (characters, caret) => {
    expect(caretIn('1ZZ BT4CK4 LR204817', characters)).toBe(caret);
  });

  it.each([
    ['', 'empty'],
    ['1ZZBT4CK4', 'short'],
    ['1ZZBT4CKO', 'wrong'],
    ['1ZZBT4CK7LR204817', 'second-look'],
    ['1ZZBT4CK4LR204817', 'fits'],
  ])('says of "%s": %s', (vin, is) => expect(vinVerdict(vin, 2026).is).toBe(is));

  it('names the digit that would fit, and the model year of one that does', () => {
    expect(vinVerdict('1ZZBT4CK7LR204817', 2026)).toMatchObject({
      words: 'The check digit does not fit: position 9 is 7, and the rest would make it 4.',
    });
    expect(vinVerdict('1ZZBT4CK4LR204817', 2026)).toEqual({
      is: 'fits',
      words: 'check digit fits, model year 2020',
      year: 2020,
    });
  });
});
