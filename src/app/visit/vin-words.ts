import { checkVin, modelYear, vinCheckDigit } from '../../../procedures/calculations/vin';
import { vinLength } from './vin-text';

/**
 * What the number says about itself while it is typed:
 * - `empty`, or `short` by so many characters;
 * - `wrong`: a character that no VIN has;
 * - `second-look`: complete, but its check digit or year code does not fit; outside North America that proves nothing;
 * - `fits`, with the model year where the code gives one.
 */
export type VinVerdict =
  | { readonly is: 'empty' }
  | { readonly is: 'short'; readonly words: string }
  | { readonly is: 'wrong'; readonly words: string }
  | { readonly is: 'second-look'; readonly words: string }
  | { readonly is: 'fits'; readonly words: string; readonly year: number | undefined };

/** `thisYear` bounds the model year: a car is not newer than next year's. */
export function vinVerdict(vin: string, thisYear: number): VinVerdict {
  if (vin === '') return { is: 'empty' };
  const strange = /[IOQ]/.exec(vin);
  if (strange) {
    return { is: 'wrong', words: `A VIN has no ${strange[0]}. Look again: a ${looksLike[strange[0]] ?? 'digit'}?` };
  }
  if (vin.length < vinLength) {
    return { is: 'short', words: `${vinLength - vin.length} more` };
  }
  const { problems } = checkVin(vin);
  if (problems.includes('check-digit')) {
    return {
      is: 'second-look',
      words: `The check digit does not fit: position 9 is ${vin.charAt(8)}, and the rest would make it ${vinCheckDigit(vin)}.`,
    };
  }
  if (problems.includes('year-code')) {
    return { is: 'second-look', words: `Position 10 is ${vin.charAt(9)}, which is no year code.` };
  }
  const year = modelYear(vin, { notAfter: thisYear + 1 });
  return { is: 'fits', words: year === undefined ? 'check digit fits' : `check digit fits, model year ${year}`, year };
}

const looksLike: Readonly<Record<string, string>> = { I: '1', O: '0', Q: '0' };
