import { draftOf, draftProblems, emptyDraft, visitOf, type VisitDraft } from './visit-draft';

const draft: VisitDraft = {
  ...emptyDraft,
  vin: '1ZZBT4CK4LR204817',
  repairOrder: ' 4417 ',
  odometer: '84,210',
  concern: 'Whistle at idle, hesitates under load',
  codes: ['P0068'],
  make: 'Merrow',
  model: 'Heron',
  colour: 'silver',
  displacementL: '1,6 l',
};
const origin = { id: 'v-1', siteId: 's-1', openedBy: 'p-1', openedAt: 1, changedAt: 2 };

describe('draftProblems', () => {
  it('finds nothing wrong with a whole draft', () => expect(draftProblems(draft, 2026)).toEqual({}));

  it('names every field that an empty draft lacks', () => {
    expect(Object.keys(draftProblems(emptyDraft, 2026))).toEqual([
      'vin',
      'repairOrder',
      'odometer',
      'concern',
      'make',
      'model',
    ]);
  });

  it.each<[keyof VisitDraft, Partial<VisitDraft>, string]>([
    ['vin', { vin: '1ZZBT4CK7LR204817' }, 'Look again, or keep it as it is.'],
    ['vin', { vin: '1ZZBT4' }, 'A VIN has 17 characters: 11 more.'],
    ['odometer', { odometer: '84.2k' }, 'Type whole digits, as the odometer shows them.'],
    ['displacementL', { displacementL: 'big' }, 'Type litres, such as 1.6.'],
    ['odometer', { odometer: '84210842108' }, 'Type at most 7 digits.'],
    ['odometer', { odometer: " '" }, 'Type what the odometer shows.'],
    ['year', { year: '2031' }, 'Type a year from 1886 to 2027.'],
    ['year', { year: '1850' }, 'Type a year from 1886 to 2027.'],
  ])('says of %s what is wrong', (field, change, words) => {
    expect(draftProblems({ ...draft, ...change }, 2026)).toEqual({ [field]: words });
  });

  it('lets an odd VIN through once it was kept after a second look', () => {
    expect(draftProblems({ ...draft, vin: '1ZZBT4CK7LR204817', isVinKept: true }, 2026)).toEqual({});
  });
});

describe('visitOf', () => {
  it('makes the visit with the digits as they were typed', () => {
    expect(visitOf(draft, origin, 2026)).toEqual({
      ...origin,
      vin: '1ZZBT4CK4LR204817',
      repairOrder: '4417',
      odometer: { text: '84210', unit: 'km' },
      concern: 'Whistle at idle, hesitates under load',
      codes: ['P0068'],
      car: { make: 'Merrow', model: 'Heron', colour: 'silver', displacementL: '1.6' },
    });
  });

  it('says that an odd VIN was kept, and only an odd one', () => {
    const odd = { ...draft, vin: '1ZZBT4CK7LR204817', isVinKept: true };
    expect(visitOf(odd, origin, 2026).vinKept).toBe('after a second look');
    expect(visitOf({ ...draft, isVinKept: true }, origin, 2026).vinKept).toBeUndefined();
  });

  it('comes back as the draft that it was made from', () => {
    const visit = visitOf(draft, origin, 2026);
    expect(visitOf(draftOf(visit), origin, 2026)).toEqual(visit);
  });
});
