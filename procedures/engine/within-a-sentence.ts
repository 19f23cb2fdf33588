/** A label or a title as it stands within a sentence; a word in capitals or with digits stays as it is: `MAP sensor`. */
export function lowerFirst(text: string): string {
  return /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}
