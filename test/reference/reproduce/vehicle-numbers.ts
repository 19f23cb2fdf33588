import { checkVin, modelYear, vinCheckDigit } from '../../../procedures/calculations';
import { type Reproduction } from './reproduction';

// 49 CFR 565.15(c), Tables III and IV, written out as the regulation has them.
const values: Readonly<Record<string, number>> = Object.fromEntries(
  'A1 B2 C3 D4 E5 F6 G7 H8 J1 K2 L3 M4 N5 P7 R9 S2 T3 U4 V5 W6 X7 Y8 Z9'
    .split(' ')
    .map((pair) => [pair.charAt(0), Number(pair.charAt(1))]),
);
const weights = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];
const weightedSum = (vin: string): number =>
  [...vin].reduce((sum, sign, index) => sum + weights[index]! * (values[sign] ?? Number(sign)), 0);

const last = { notAfter: 2039 };
const withPosition7 = (vin: string, sign: string): string => vin.slice(0, 6) + sign + vin.slice(7);

/** Section j: vehicle identification numbers. */
export const vehicleNumbers: readonly Reproduction[] = [
  {
    topic: 'j',
    inputs: ['vin'],
    only: ({ expected }) => expected['valid'] === true,
    give: (_given, { inputs }) => {
      const vin = String(inputs['vin']);
      return {
        valid: checkVin(vin).valid,
        check_digit: vinCheckDigit(vin),
        weighted_sum: weightedSum(vin),
        // A digit in position 7 asks for the first cycle of years, a letter for the second.
        model_year_candidates: ['1', 'A'].map((sign) => modelYear(withPosition7(vin, sign), last)),
        model_year_by_position_7: modelYear(vin, last),
      };
    },
  },
  {
    topic: 'j',
    inputs: ['vin'],
    only: ({ expected }) => expected['valid'] === false,
    give: (_given, { inputs }) => {
      const { valid, problems } = checkVin(String(inputs['vin']));
      return { valid, reason: problems[0] };
    },
  },
];
