/** A place in a document as a lead says it: the step by its number, the rest by names. */
export interface PlaceInWords {
  /** The step's id, where there is a step and it has one. */
  readonly step?: string;
  /** `Step 11, branch 2`; empty for the document as a whole. */
  readonly words: string;
}

/** Lists whose items are called by what they are and their own name. */
const listWords: Readonly<Record<string, string>> = {
  steps: 'step',
  gear: 'gear',
  inputs: 'input',
  limits: 'limit',
  reads: 'reading',
  ways: 'way',
  next: 'branch',
  results: 'result',
  options: 'option',
  finds: 'find',
  channels: 'channel',
  windows: 'window',
  cautions: 'caution',
  throughout: 'caution throughout',
  disturbs: 'disturbed',
  prerequisites: 'prerequisite',
  stopActions: 'stop action',
  makeSafe: 'make-safe action',
};
/** What an item is told apart by, first found. */
const ownNames = ['number', 'name', 'role', 'id', 'item'] as const;

/** Says where a JSON pointer (RFC 6901) leads in a value of unknown shape. */
export function placeInWords(value: unknown, pointer: string): PlaceInWords {
  const segments = pointer.split('/').slice(1).map(unescaped);
  const words: string[] = [];
  let step: string | undefined;
  let at: unknown = value;
  let list = '';
  for (const [index, segment] of segments.entries()) {
    at = memberOf(at, segment);
    if (!/^\d+$/.test(segment)) {
      list = segment;
      const isNamedByItem = listWords[segment] !== undefined && Array.isArray(at) && index + 1 < segments.length;
      if (!isNamedByItem) words.push(`\`${segment}\``);
      continue;
    }
    const called = ownNames.map((name) => memberOf(at, name)).find((name) => typeof name === 'string' && name !== '');
    const plain = listWords[list];
    if (plain === undefined) words.push(`${words.pop() ?? ''} ${Number(segment) + 1}`.trim());
    else words.push(`${plain} ${typeof called === 'string' ? called : Number(segment) + 1}`);
    const id = memberOf(at, 'id');
    if (list === 'steps' && typeof id === 'string') step = id;
  }
  const sentence = words.join(', ');
  return { ...(step === undefined ? {} : { step }), words: sentence.charAt(0).toUpperCase() + sentence.slice(1) };
}

/** A value's own member: the value is anything that a file may hold. */
export function memberOf(value: unknown, key: string): unknown {
  if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
  return (value as Readonly<Record<string, unknown>>)[key];
}

function unescaped(segment: string): string {
  return segment.replaceAll('~1', '/').replaceAll('~0', '~');
}
