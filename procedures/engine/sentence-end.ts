/** A person's words as a sentence: with a full stop where they have no end of their own. */
export function endStop(text: string): string {
  const tidy = text.trim();
  return /[.!?]$/.test(tidy) ? tidy : `${tidy}.`;
}
