import fc from 'fast-check';
import { jsonMistake } from './json-mistake';

it.each([
  ['{\n  "format": 1,\n  "id" "x"\n}', 3, 8, 'a colon'],
  ['{\n  "format": 1,\n}', 3, 1, 'a name in quotation marks'],
  ['{ "a": [1, 2 3] }', 1, 14, 'a comma or ]'],
  ['{ "a": 1 "b": 2 }', 1, 10, 'a comma or }'],
  ['{ "a": }', 1, 8, 'a value'],
  ['{ a: 1 }', 1, 3, 'a name in quotation marks or }'],
  ['{ "ä": "one\ntwo" }', 1, 12, 'other text'],
  ['["\\x"]', 1, 3, 'other text'],
  ['{ "a": "cut', 1, 12, 'the quotation mark that ends the text'],
  ['{ "format": 1', 1, 14, 'a comma or }'],
  ['[', 1, 2, 'a value or ]'],
  ['', 1, 1, 'a value'],
  ['01', 1, 2, 'the end of the file'],
  ['{} {}', 1, 4, 'the end of the file'],
])('%j is wrong at line %d, column %d: %s', (text, line, column, expected) => {
  expect(jsonMistake(text)).toEqual({ line, column, expected });
});

it('does not run out of stack', () => {
  expect(jsonMistake('['.repeat(1_000_000))).toMatchObject({ line: 1, column: 1_000_001 });
  expect(jsonMistake(`"${'\\n'.repeat(1_000_000)}"`)).toBeUndefined();
});

it('finds a mistake in exactly what JSON.parse refuses', () => {
  const piece = fc.constantFrom('{', '}', '[', ']', ',', ':', '"', '\\', 'a', '\\u00e9', '0', '-', '.5', 'e3', 'null');
  const random = fc.array(fc.oneof(piece, fc.constantFrom(' ', '\n', '\t', '\u00a0', '\u0001')), { maxLength: 12 });
  const damaged = fc
    .tuple(fc.json(), fc.nat(), piece)
    .map(([text, at, added]) => text.slice(0, at % (text.length + 1)) + added + text.slice(at % (text.length + 1)));
  let wrong = 0;
  fc.assert(
    fc.property(
      fc.oneof(
        fc.json(),
        damaged,
        random.map((pieces) => pieces.join('')),
      ),
      (text) => {
        let isJson = true;
        try {
          JSON.parse(text);
        } catch {
          isJson = false;
          wrong += 1;
        }
        expect([text, jsonMistake(text) === undefined]).toEqual([text, isJson]);
      },
    ),
    { seed: 20261202, numRuns: 5_000 },
  );
  expect(wrong).toBeGreaterThan(1_000);
});

it('names the first character that no JSON goes on with', () => {
  fc.assert(
    fc.property(fc.json(), fc.nat(), (text, cut) => {
      // A beginning of JSON is wrong only at its end, if anywhere.
      const beginning = text.slice(0, cut % (text.length + 1));
      const mistake = jsonMistake(beginning);
      const isAtEnd = mistake?.column === [...beginning].length + 1 && mistake.line === 1;
      const isInToken = /[-.eEtrufalsn\\\dA-Fa-f+]$/.test(beginning);
      expect([beginning, mistake === undefined || isAtEnd || isInToken]).toEqual([beginning, true]);
    }),
    { seed: 20261203, numRuns: 2_000 },
  );
});
