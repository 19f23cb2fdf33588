/** Keeps a figure, its uncertainty and its unit on one line: the blanks between them do not break. */
export function unbroken(text: string): string {
  return text.replace(/ \u00b1 /g, '\u00a0\u00b1\u00a0').replace(/(\d) (kPa|hPa|\u00b0C|K|s|km|V)\b/g, '$1\u00a0$2');
}
