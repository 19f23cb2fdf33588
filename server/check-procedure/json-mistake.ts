/** Where a text stops being JSON, and what should stand there. */
export interface JsonMistake {
  /** From 1, as editors count. */
  readonly line: number;
  readonly column: number;
  /** `a comma or }`; for a sentence that ends with it. */
  readonly expected: string;
}

type Expecting = 'value' | 'value or ]' | 'name' | 'name or }' | 'colon' | 'comma' | 'end';

const words: Readonly<Record<Exclude<Expecting, 'comma'>, string>> = {
  value: 'a value',
  'value or ]': 'a value or ]',
  name: 'a name in quotation marks',
  'name or }': 'a name in quotation marks or }',
  colon: 'a colon',
  end: 'the end of the file',
};

const space = /[ \t\n\r]*/y;
const number = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const literal = /true|false|null/y;
/** A string without its end, so that it stops where the mistake is. */
const string = /"[^"\\\u0000-\u001f]*(?:\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})[^"\\\u0000-\u001f]*)*/y;

/**
 * The first place at which a text is not JSON (RFC 8259); undefined when it is. `JSON.parse` names the place only for
 * some mistakes, and differently from engine to engine. Linear time, without recursion.
 */
export function jsonMistake(text: string): JsonMistake | undefined {
  const open: ('{' | '[')[] = [];
  let expecting: Expecting = 'value';
  let at = 0;
  const end = (token: RegExp): number | undefined => {
    token.lastIndex = at;
    return token.test(text) ? token.lastIndex : undefined;
  };
  const mistake = (expected: string): JsonMistake => ({ ...placeOf(text, at), expected });
  const inside = (): Expecting => (open.length === 0 ? 'end' : 'comma');
  for (;;) {
    at = end(space) ?? at;
    const character = text[at];
    if (character === undefined && expecting === 'end') return undefined;
    const closes = open.at(-1) === '{' ? '}' : ']';
    const mayClose = expecting === 'comma' || expecting === 'value or ]' || expecting === 'name or }';
    const mayOpen: boolean = expecting === 'value' || expecting === 'value or ]';
    if (mayClose && character === closes) {
      at += 1;
      open.pop();
      expecting = inside();
    } else if (expecting === 'comma' && character === ',') {
      at += 1;
      expecting = closes === '}' ? 'name' : 'value';
    } else if (expecting === 'colon' && character === ':') {
      at += 1;
      expecting = 'value';
    } else if (mayOpen && (character === '{' || character === '[')) {
      at += 1;
      open.push(character);
      expecting = character === '{' ? 'name or }' : 'value or ]';
    } else if ((mayOpen || expecting === 'name' || expecting === 'name or }') && character === '"') {
      at = end(string) ?? at;
      if (text[at] !== '"') return mistake(at === text.length ? 'the quotation mark that ends the text' : 'other text');
      at += 1;
      expecting = mayOpen ? inside() : 'colon';
    } else {
      const after = mayOpen ? (end(number) ?? end(literal)) : undefined;
      if (after === undefined) return mistake(expecting === 'comma' ? `a comma or ${closes}` : words[expecting]);
      at = after;
      expecting = inside();
    }
  }
}

function placeOf(text: string, at: number): Pick<JsonMistake, 'line' | 'column'> {
  const before = text.slice(0, at);
  const lineStart = before.lastIndexOf('\n') + 1;
  return { line: before.split('\n').length, column: [...before.slice(lineStart)].length + 1 };
}
