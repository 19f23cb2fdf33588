/** The systems of a trouble code, first letter and meaning (SAE J2012 / ISO 15031-6, from memory). */
export const codeSystems: readonly { readonly letter: string; readonly words: string }[] = [
  { letter: 'P', words: 'powertrain' },
  { letter: 'C', words: 'chassis' },
  { letter: 'B', words: 'body' },
  { letter: 'U', words: 'network' },
];

/** The sixteen digits as the pad has them, row by row. */
export const hexDigits: readonly string[] = [...'789A456B123C0DEF'];

/** A trouble code has its letter and four digits: the first 0 to 3, the rest hexadecimal. */
export const codeLength = 5;

/** Whether a key may follow what is typed so far. */
export function mayFollow(text: string, key: string): boolean {
  if (text.length === 0) return /^[PCBU]$/.test(key);
  if (text.length === 1) return /^[0-3]$/.test(key);
  return text.length < codeLength && /^[0-9A-F]$/.test(key);
}

/** The code after one key, or as it was where the key may not follow. */
export function typeCode(text: string, key: string): string {
  const upper = key.toUpperCase();
  return mayFollow(text, upper) ? text + upper : text;
}

export const isWholeCode = (text: string): boolean => text.length === codeLength;
