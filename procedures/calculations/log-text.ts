/** Characters are put together in pieces: one call with a million arguments would overflow the stack. */
const pieceLength = 8192;

function textOf(codeUnits: Uint16Array): string {
  let text = '';
  for (let start = 0; start < codeUnits.length; start += pieceLength) {
    text += String.fromCharCode(...codeUnits.subarray(start, start + pieceLength));
  }
  return text;
}

function fromUtf16(bytes: Uint8Array, highFirst: boolean): string {
  const codeUnits = new Uint16Array(bytes.length >> 1);
  for (let index = 0; index < codeUnits.length; index++) {
    const [first = 0, second = 0] = [bytes[2 * index], bytes[2 * index + 1]];
    codeUnits[index] = highFirst ? first * 256 + second : second * 256 + first;
  }
  return textOf(codeUnits);
}

/** Lowest code point of a UTF-8 sequence by its length: a longer way of writing a character is not allowed. */
const lowestOfLength = [0, 0, 0x80, 0x800, 0x10000];

function sequenceLength(lead: number): number {
  if (lead < 0x80) return 1;
  if (lead >= 0xc2 && lead < 0xe0) return 2;
  if (lead >= 0xe0 && lead < 0xf0) return 3;
  return lead >= 0xf0 && lead < 0xf5 ? 4 : 0;
}

/** Decodes UTF-8 (RFC 3629), or gives undefined when the bytes are not UTF-8. */
function fromUtf8(bytes: Uint8Array): string | undefined {
  const codeUnits = new Uint16Array(bytes.length);
  let count = 0;
  for (let index = 0; index < bytes.length;) {
    const lead = bytes[index] ?? 0;
    const length = sequenceLength(lead);
    if (length === 0 || index + length > bytes.length) return undefined;
    let code = length === 1 ? lead : lead & (0xff >> (length + 1));
    for (let step = 1; step < length; step++) {
      const next = bytes[index + step] ?? 0;
      if ((next & 0xc0) !== 0x80) return undefined;
      code = code * 64 + (next & 0x3f);
    }
    if (code < (lowestOfLength[length] ?? 0) || code > 0x10ffff || (code >= 0xd800 && code < 0xe000)) return undefined;
    if (code > 0xffff) codeUnits[count++] = 0xd7c0 + (code >> 10);
    codeUnits[count++] = code > 0xffff ? 0xdc00 + (code & 0x3ff) : code;
    index += length;
  }
  return textOf(codeUnits.subarray(0, count));
}

/** Of how many bytes at the start the zeros are counted to tell UTF-16 without a byte-order mark. */
const lookLength = 1024;

/** Which of two neighbouring bytes is zero in a text of Latin letters tells the byte order; undefined when none is. */
function utf16Order(bytes: Uint8Array): 'high-first' | 'low-first' | undefined {
  const pairs = Math.min(bytes.length, lookLength) >> 1;
  let [evenZeros, oddZeros] = [0, 0];
  for (let pair = 0; pair < pairs; pair++) {
    if (bytes[2 * pair] === 0) evenZeros++;
    if (bytes[2 * pair + 1] === 0) oddZeros++;
  }
  if (pairs > 0 && oddZeros > 0.8 * pairs && evenZeros < 0.1 * pairs) return 'low-first';
  return pairs > 0 && evenZeros > 0.8 * pairs && oddZeros < 0.1 * pairs ? 'high-first' : undefined;
}

/**
 * Decodes the bytes of a log: UTF-8 or UTF-16 by their byte-order mark, UTF-16 without one by its zeros, UTF-8 where
 * the bytes are valid, and Latin-1 otherwise, in which every byte is a character. Never throws. Linear time.
 */
export function decodeLog(bytes: Uint8Array): string {
  const [first, second, third] = bytes;
  if (first === 0xff && second === 0xfe) return fromUtf16(bytes.subarray(2), false);
  if (first === 0xfe && second === 0xff) return fromUtf16(bytes.subarray(2), true);
  const order = utf16Order(bytes);
  if (order !== undefined) return fromUtf16(bytes, order === 'high-first');
  const hasMark = first === 0xef && second === 0xbb && third === 0xbf;
  return fromUtf8(hasMark ? bytes.subarray(3) : bytes) ?? textOf(Uint16Array.from(bytes));
}

/** Leaves out the NUL characters at the end, with which a recorder that lost its supply fills up its last block. */
export function withoutPadding(text: string): string {
  let length = text.length;
  while (length > 0 && text.charCodeAt(length - 1) === 0) length--;
  return text.slice(0, length);
}

/** Of text, hardly any character is a control character; of anything else, many are. */
const mostControlShare = 0.02;

/** Whether the text is none: too many control characters among the first hundred thousand. */
export function isBinary(text: string): boolean {
  const length = Math.min(text.length, 100_000);
  let controls = 0;
  for (let index = 0; index < length; index++) {
    const code = text.charCodeAt(index);
    const isLayout = code === 9 || code === 10 || code === 12 || code === 13;
    if ((code < 32 && !isLayout) || (code >= 0x7f && code < 0xa0) || code >= 0xfff0) controls++;
  }
  return controls > mostControlShare * length;
}
