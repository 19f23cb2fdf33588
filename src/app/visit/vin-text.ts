/** World maker identifier, descriptor, indicator: the sections of a vehicle identification number (ISO 3779). */
const sections = [3, 6, 8] as const;
export const vinLength = 17;

/** What is typed, as the number itself: upper case, without blanks and hyphens, no longer than a VIN is. */
export function tidyVin(typed: string): string {
  return typed
    .toUpperCase()
    .replace(/[^A-Z0-9]/g, '')
    .slice(0, vinLength);
}

/** The number in its sections: `1ZZ BT4CK4 LR204817`. */
export function groupVin(vin: string): string {
  let start = 0;
  return sections
    .map((length) => vin.slice(start, (start += length)))
    .filter((section) => section !== '')
    .join(' ');
}

/** Where the caret belongs in the grouped text, so that as many characters lie before it as before. */
export function caretIn(grouped: string, charactersBefore: number): number {
  let seen = 0;
  for (let index = 0; index < grouped.length; index += 1) {
    if (seen === charactersBefore) return index;
    if (grouped.charAt(index) !== ' ') seen += 1;
  }
  return grouped.length;
}
