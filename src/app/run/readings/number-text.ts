/** What the number pad, or a keyboard, can do to a figure. */
export type PadKey = '0' | '1' | '2' | '3' | '4' | '5' | '6' | '7' | '8' | '9' | '.' | '-' | 'erase';

/** More characters than any instrument's display has. */
const longest = 10;

/** The figure after one key. Digits stay as they were typed, so that `12.60` keeps its last digit. */
export function pressKey(text: string, key: PadKey): string {
  switch (key) {
    case 'erase':
      return text.slice(0, -1);
    case '-':
      return text.startsWith('-') ? text.slice(1) : within(`-${text}`, text);
    case '.':
      if (text.includes('.')) return text;
      return within(/\d$/.test(text) ? `${text}.` : `${text}0.`, text);
    default:
      return within(/^-?0$/.test(text) ? `${text.slice(0, -1)}${key}` : `${text}${key}`, text);
  }
}

/** The pad's key for a key of a keyboard; undefined for any other, letters above all. */
export function padKeyOf(keyboardKey: string): PadKey | undefined {
  if (/^[0-9]$/.test(keyboardKey)) return keyboardKey as PadKey;
  switch (keyboardKey) {
    case '.':
    case ',':
    case 'Decimal':
      return '.';
    case '-':
    case '\u2212':
    case 'Subtract':
      return '-';
    case 'Backspace':
    case 'Delete':
      return 'erase';
    default:
      return undefined;
  }
}

/** The figure as it is shown, with a real minus sign. */
export function shownFigure(text: string): string {
  return text.replace('-', '\u2212');
}

const within = (next: string, before: string): string => (next.length > longest ? before : next);
