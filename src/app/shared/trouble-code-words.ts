// By its path: through the room's face the list of meanings would come with the first step already.
import { describeTroubleCode } from '../../../procedures/calculations/trouble-code';

/** Letter, digit 0 to 3, three hexadecimal digits (SAE J2012 / ISO 15031-6, from memory). */
const form = /^[PCBU][0-3][0-9A-F]{3}$/;
/** P0, P2 and P34 to P39 are generic, as are B0, C0, U0 and U3; the maker defines the others (from memory). */
const generic = /^(P0|P2|P3[4-9A-F]|[BCU]0|U3)/;

/** The codes in a text that was typed or pasted, upper case, each once, in order. */
export function codesIn(typed: string): readonly string[] {
  const words = typed.toUpperCase().split(/[\s,;]+/);
  return [...new Set(words.filter((word) => word !== ''))];
}

/** What is wrong with a code; undefined when it has the form of one. */
export function codeProblem(code: string): string | undefined {
  return form.test(code)
    ? undefined
    : `${code} is no trouble code: a letter P, C, B or U and four digits, such as P0068.`;
}

/** What a code means in plain words; a maker's own code is never guessed. */
export function codeWords(code: string): string {
  const known = describeTroubleCode(code);
  if (known !== undefined) return known;
  return generic.test(code) ? 'generic, no words for it here' : "the maker's own: see their service information";
}
