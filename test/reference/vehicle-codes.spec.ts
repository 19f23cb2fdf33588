import { checkVin, decodeTroubleCode, modelYear, vinCheckDigit } from '../../procedures/calculations';
import { checkValues } from './check-values';

describe('vehicle identification numbers', () => {
  const all = checkValues('j', 'vin');

  it.each(all.filter(([, { expected }]) => expected['valid'] === true))('%s', (_title, { inputs, expected }) => {
    const vin = String(inputs['vin']);
    expect(checkVin(vin)).toEqual({ valid: true, problems: [] });
    expect(vinCheckDigit(vin)).toBe(expected['check_digit']);
    expect(modelYear(vin, { notAfter: 2039 })).toBe(expected['model_year_by_position_7']);
  });

  it.each(all.filter(([, { expected }]) => expected['valid'] === false))('%s', (_title, { inputs, expected }) => {
    const { valid, problems } = checkVin(String(inputs['vin']));
    expect(valid).toBe(false);
    expect(problems[0]).toBe(expected['reason']);
  });
});

describe('trouble codes', () => {
  it.each(checkValues('k', 'dtc_bytes'))('%s', (_title, { inputs, expected }) => {
    const [high = NaN, low = NaN] = String(inputs['dtc_bytes'])
      .split(' ')
      .map((byte) => parseInt(byte, 16));
    const text = String(expected['text']);
    expect(decodeTroubleCode(high, low)).toBe(text.startsWith('none') ? undefined : text);
  });
});
