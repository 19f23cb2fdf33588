import { requireByte } from './byte';
import { genericTroubleCodes } from './generic-trouble-codes';

const systems = 'PCBU';

/**
 * Gives the trouble code of two bytes as it is written, or undefined for 00 00, which only fills a message up.
 *
 * Bits 15 and 14 give the system (P powertrain, C chassis, B body, U network), bits 13 and 12 the first digit 0 to 3,
 * and the remaining twelve bits three hexadecimal digits.
 *
 * Throws RangeError unless both are whole numbers from 0 to 255. Source: SAE J2012 / ISO 15031-6 (from memory).
 *
 * @example decodeTroubleCode(0x01, 0x01) // 'P0101'
 */
export function decodeTroubleCode(high: number, low: number): string | undefined {
  const bits = requireByte('high', high) * 256 + requireByte('low', low);
  if (bits === 0) return undefined;
  const digits = (bits & 0xfff).toString(16).toUpperCase().padStart(3, '0');
  return `${systems.charAt(bits >> 14)}${(bits >> 12) & 3}${digits}`;
}

/**
 * Gives the generic meaning of a trouble code in plain words, or undefined when it is not in the list: maker-specific
 * codes are never guessed. Takes the code in any case and with blanks around it.
 *
 * The words are a reading aid, written from memory of SAE J2012 / ISO 15031-6, not the standard's text; editions
 * differ in wording.
 *
 * @example describeTroubleCode('P0171') // 'System too lean (bank 1)'
 */
export function describeTroubleCode(code: string): string | undefined {
  return genericTroubleCodes.get(code.trim().toUpperCase());
}
