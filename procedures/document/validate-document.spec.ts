import { everyKind } from './testing/every-kind';
import { memberOf } from './place-in-words';
import { validateDocument, type DocumentProblem } from './validate-document';

type Json = Record<string, unknown>;

const copy = (): Json => JSON.parse(JSON.stringify(everyKind)) as Json;

/** The object or list at a path of the copy. */
function at(document: Json, path: string): Json {
  return path.split('/').reduce<unknown>((value, key) => memberOf(value, key), document) as Json;
}

function problemsOf(value: unknown): readonly DocumentProblem[] {
  const answer = validateDocument(value);
  return answer.ok ? [] : answer.problems;
}

/** Every object inside a value with its JSON pointer. */
function objectsIn(value: unknown, pointer = ''): { readonly pointer: string; readonly object: Json }[] {
  if (typeof value !== 'object' || value === null) return [];
  const inside = Object.entries(value).flatMap(([key, child]) => objectsIn(child, `${pointer}/${key}`));
  return Array.isArray(value) ? inside : [{ pointer, object: value as Json }, ...inside];
}

it('accepts a document with every kind of step and every field', () => {
  expect(problemsOf(everyKind)).toEqual([]);
  expect(validateDocument(copy())).toEqual({ ok: true, document: everyKind });
});

it('accepts each result of a finding, the one too close to call among them, and no other', () => {
  const place = everyKind.steps.findIndex(({ kind }) => kind === 'finding');
  const accepted = ['in', 'out', 'too-close', 'not-judged', 'open', ''].filter((result) => {
    const document = copy();
    at(document, `steps/${place}`)['result'] = result;
    return validateDocument(document).ok;
  });
  expect(accepted).toEqual(['in', 'out', 'too-close', 'not-judged']);
});

describe('each field of each part', () => {
  /** The fields that the types mark as optional. */
  const optional = [
    'pair',
    'optional',
    'shows',
    'sense',
    'default',
    'verdict',
    'atMost',
    'thenceforth',
    'band',
    'low',
    'high',
    'when',
    'unjudged',
    'gear',
    'takes',
    'ways',
    'validity',
    'minutes',
    'until',
    'short',
    'notes',
    'stay',
    'release',
    'verify',
    'heldAs',
    'begins',
    'ends',
    'atLeastSeconds',
    'entry',
    'uncertainty',
    'why',
    'cautions',
    'picture',
    'labels',
    'disturbs',
    'next',
    'results',
    'several',
    'ask',
    'comparedWith',
    'newCodes',
    'nextProcedure',
  ];
  /** Where a name that is optional elsewhere is needed. */
  const neededAt = [
    /^\/gear$/, // the list of gear
    /\/(shows|plausible)\/(low|high)$/,
    /\/next\/\d+\/when$/,
    /^\/steps\/1[3-6]\/verdict$/, // a finding's verdict
    /^\/steps\/9\/until$/, // what is waited for
    /^\/steps\/19\/takes$/, // what a call takes over
    /^\/steps\/17\/shows$/, // what a photo must show
    /\/(atMost|thenceforth)$/, // each needs the other
  ];
  const isOptional = (pointer: string, field: string): boolean =>
    optional.includes(field) && !neededAt.some((pattern) => pattern.test(`${pointer}/${field}`));

  const parts = objectsIn(everyKind);

  it('is refused where it is needed and taken out, and only there', () => {
    let count = 0;
    for (const { pointer, object } of parts) {
      if (pointer.endsWith('/labels')) continue;
      for (const field of Object.keys(object)) {
        const document = copy();
        const part = at(document, pointer.slice(1)) ?? document;
        delete (pointer === '' ? document : part)[field];
        const problems = problemsOf(document);
        const place = `${pointer}/${field}`;
        expect([place, problems.length === 0]).toEqual([place, isOptional(pointer, field)]);
        if (problems.length > 0) expect(problems.map((problem) => problem.pointer)).toContain(pointer);
        count += 1;
      }
    }
    expect(count).toBeGreaterThan(400);
  });

  it('is refused beside a field that nobody knows', () => {
    for (const { pointer } of parts) {
      const document = copy();
      const part = pointer === '' ? document : at(document, pointer.slice(1));
      part['sedulous'] = { odd: true };
      expect([pointer, problemsOf(document).length > 0]).toEqual([pointer, true]);
    }
  });

  it('is refused with another kind of value', () => {
    for (const { pointer, object } of parts) {
      for (const field of Object.keys(object)) {
        const document = copy();
        const part = pointer === '' ? document : at(document, pointer.slice(1));
        part[field] = { odd: true };
        const place = `${pointer}/${field}`;
        expect([place, problemsOf(document).length > 0]).toEqual([place, true]);
      }
    }
  });
});

describe('the words', () => {
  const cases: readonly (readonly [what: string, path: string, change: (part: Json) => void, message: RegExp])[] = [
    [
      'a missing way on',
      'steps/10',
      (step) => delete step['otherwise'],
      /^Step 11: `otherwise` is missing: say where it goes on\.$/,
    ],
    ['a slip in a name', 'steps/3', (step) => (step['cautoins'] = []), /^Step 4: `cautoins` is not known here: .*slip/],
    [
      'an unknown kind',
      'steps/4',
      (step) => (step['kind'] = 'task'),
      /^Step 5: `kind` is "task"; it must be one of start, action, reading/,
    ],
    ['a missing kind', 'steps/4', (step) => delete step['kind'], /^Step 5: `kind` is missing: say what kind it is\.$/],
    [
      'a missing reason',
      'steps/3/next/1',
      (branch) => delete branch['because'],
      /^Step 4, branch 2: `because` is missing: say why it goes this way\.$/,
    ],
    [
      'a bound alone',
      'steps/3/next/1',
      (branch) => delete branch['thenceforth'],
      /^Step 4, branch 2: `thenceforth` is missing: say where it goes on once the bound is reached\.$/,
    ],
    [
      'a band without an end',
      'steps/3/reads/0/band',
      (band) => {
        delete band['low'];
        delete band['high'];
      },
      /^Step 4, reading manifoldPressure, `band`: a band has at least one end/,
    ],
    [
      'an unknown unit',
      'steps/3/reads/0',
      (read) => (read['unit'] = 'kpa'),
      /^Step 4, reading manifoldPressure, `unit`: must be one of "kPa"/,
    ],
    [
      'a number as text',
      'gear/0/shows',
      (shows) => (shows['high'] = '60'),
      /^Gear gauge, `shows`, `high`: must be a number without quotation marks\.$/,
    ],
    [
      'no source',
      'inputs/1',
      (input) => delete input['source'],
      /^Input sealHigh: `source` is missing: say who says so.*common practice, no source/,
    ],
    ['an empty list', 'steps/2', (step) => (step['reads'] = []), /^Step 3, `reads`: must have at least 1\.$/],
    [
      'too many',
      'start',
      (start) => (start['stopActions'] = ['a', 'b', 'c', 'd']),
      /^`start`, `stopActions`: must have at most 3\.$/,
    ],
    ['an empty text', 'steps/5', (step) => (step['title'] = ''), /^Step 6, `title`: must not be empty\.$/],
    [
      'a long text',
      'steps/5',
      (step) => (step['title'] = 'x'.repeat(121)),
      /^Step 6, `title`: must not be longer than 120 characters\.$/,
    ],
    [
      'a bad name',
      'steps/3/reads/0',
      (read) => (read['name'] = 'Manifold pressure'),
      /must be a name: letters and digits, first letter small/,
    ],
    ['a number for a figure', 'inputs/1', (input) => (input['default'] = '5,0'), /must be a figure as text/],
    [
      'a bad label',
      'steps/3/picture',
      (picture) => (picture['labels'] = { 'a part': 'x' }),
      /`a part` cannot be a name here/,
    ],
    ['another format', '', (document) => (document['format'] = 2), /^`format`: must be 1\.$/],
    ['a step that is none', 'steps', (steps) => (steps['1'] = 'read'), /^Step 2: must be a group of fields \{ \}\.$/],
    ['too many takes', 'steps/3/reads/0', (read) => (read['takes'] = 6), /`takes`: must be 5 or less/],
  ];
  test.each(cases)('of %s', (_what, path, change, message) => {
    const document = copy();
    change(path === '' ? document : at(document, path));
    const problems = problemsOf(document);
    expect(problems.map((problem) => problem.message)).toEqual([expect.stringMatching(message)]);
    const inStep = /^steps\/\d+/.test(path);
    const step = everyKind.steps[Number(path.split('/')[1])];
    expect(problems[0]?.step).toBe(inStep ? step?.id : undefined);
  });
});

describe('anything at all', () => {
  test.each([
    ['nothing', undefined],
    ['null', null],
    ['text', 'procedure'],
    ['a list', []],
    ['an empty object', {}],
    ['an object that lies about its kind', { __proto__: { format: 1 } }],
    ['steps of nonsense', { ...everyKind, steps: [null, 3, 'x', [], {}] }],
  ])('%s is refused in words', (_what, value) => {
    const problems = problemsOf(value);
    expect(problems.length).toBeGreaterThan(0);
    for (const { message } of problems) expect(message).toMatch(/^\S.*\.$/);
  });

  it('gives at most 50 problems', () => {
    const steps = Array.from({ length: 400 }, () => ({ kind: 'action' }));
    expect(problemsOf({ ...everyKind, steps })).toHaveLength(50);
  });

  it('counts characters as people do', () => {
    const document = copy();
    at(document, 'steps/5')['title'] = '\u{1F527}'.repeat(120);
    expect(problemsOf(document)).toEqual([]);
  });
});
