import type { Row } from './run-driver';

/*
 * Rows that many tables of the crankcase valve seal share. The invented Ossenholt Garage stands at 640 m: an altimeter
 * setting of 1014 hPa is 93.9 kPa there.
 */

const codesAndAir: readonly Row[] = [
  ['3', { codes: [{ code: 'P0068', status: 'stored', freezeFrame: '2,140 rpm, 74 kPa, 81 degC' }] }],
  ['4', { read: { stationPressure: '1014' }, way: 'altimeter-setting' }],
];

/** Steps 2e to 4 of a cold half: coolant 14, air around the car 12. */
export const coldToAir: readonly Row[] = [
  ['2e', { read: { coolantTemperature: '14', ambientTemperature: '12' } }],
  ...codesAndAir,
];

/** Steps 2b to 4 of a warm half: coolant to 86. */
export const warmToAir: readonly Row[] = [['2b', { read: { coolantTemperature: ['61', '86'] } }], ...codesAndAir];

/** Steps 5 and 6 with both sensors in band. */
export const sensorsInBand: readonly Row[] = [
  ['5', { read: { manifoldPressure: '94.2' } }],
  ['6', { read: { boostPressure: '93.9' } }],
];

/** Step 15b: the gauge back at zero. */
export const gaugeAtZero: readonly Row[] = [['15b', { read: { gaugeLeft: '0.0' } }]];

/** Steps 18a and 18b: one code of the test's own beside the old one; both cleared. */
export const codesClearedAfter: readonly Row[] = [
  [
    '18a',
    {
      codes: [
        { code: 'P0068', status: 'stored' },
        { code: 'P0106', status: 'pending' },
      ],
    },
  ],
  ['18b', { choose: ['codesCleared'] }],
];

/** Step 19: the pair's other half comes next. */
export const otherHalfNext: readonly Row[] = [['19', { choose: ['otherHalfToCome'] }]];
