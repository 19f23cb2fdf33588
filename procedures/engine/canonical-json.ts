import canonicalize from 'canonicalize';

/**
 * RFC 8785 (JSON Canonicalization Scheme): object members sorted by UTF-16 units, no blanks, ECMAScript numbers.
 * Throws `TypeError` for what JSON cannot hold (NaN, infinities, undefined at the top).
 */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError('canonicalJson: the value has no JSON form');
  return text;
}
