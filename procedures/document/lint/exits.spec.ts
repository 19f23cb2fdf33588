import { lintProcedure } from '../lint';
import type { ProcedureDocument } from '../procedure-document';
import { changedDocument, type Part } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { place } from '../testing/lint-cases';

/** `everyKind` with other branches at a step; each leads on as `otherwise` does. */
function deciding(
  step: string,
  conditions: readonly string[],
  ...more: Parameters<typeof changedDocument>[1][]
): ProcedureDocument {
  return changedDocument(
    everyKind,
    [
      place(step),
      (part) => {
        const { to } = part['otherwise'] as { to: string };
        part['next'] = conditions.map((when) => ({ when, to, because: 'so it is' }));
      },
    ],
    ...more,
  );
}

function exits(document: ProcedureDocument): {
  readonly errors: readonly string[];
  readonly warnings: readonly string[];
} {
  const { errors, warnings } = lintProcedure(document);
  const said = (findings: typeof errors): readonly string[] =>
    findings.filter(({ rule }) => rule === 'one-exit').map(({ message }) => message);
  return { errors: said(errors), warnings: said(warnings) };
}

describe('a branch that no run can take is refused, with what stands in its way', () => {
  test.each<readonly [what: string, step: string, conditions: readonly string[], messages: readonly RegExp[]]>([
    [
      'the same condition twice',
      'judge',
      ['noiseHeard', 'noiseHeard'],
      [/^Step 7, branch 2: is never taken: branch 1 \(noiseHeard\) takes every case/],
    ],
    [
      'a part of an earlier one',
      'judge',
      ['noiseHeard', 'noiseHeard and stillQuiet'],
      [/^Step 7, branch 2: is never taken: branch 1/],
    ],
    [
      'a figure behind a lower one',
      'settle',
      ['gaugeLeft > 2 kPa', 'gaugeLeft > 5 kPa'],
      [/^Step 10, branch 2: is never taken: branch 1 \(gaugeLeft > 2 kPa\)/],
    ],
    ['a figure in another unit', 'settle', ['gaugeLeft >= 20 hPa', 'gaugeLeft > 2 kPa'], [/^Step 10, branch 2/]],
    ['a figure that an input gives', 'settle', ['gaugeLeft > sealHigh', 'gaugeLeft > 5 kPa'], [/^Step 10, branch 2/]],
    [
      'two halves and a rest',
      'settle',
      ['gaugeLeft < 5 kPa', 'gaugeLeft >= 5 kPa', 'gaugeLeft > 1 kPa'],
      [/^Step 10, branch 3: is never taken: the branches before it take every case/],
    ],
    [
      'a contradiction of figures',
      'settle',
      ['gaugeLeft > 5 kPa and gaugeLeft < 2 kPa'],
      [/^Step 10, branch 1: is never taken: its condition \(gaugeLeft > 5 kPa and gaugeLeft < 2 kPa\) never holds/],
    ],
    ['beyond what can be believed', 'settle', ['gaugeLeft > 60 kPa'], [/^Step 10, branch 1: .*never holds/]],
    ['a contradiction of truths', 'judge', ['noiseHeard and not noiseHeard'], [/never holds/]],
    [
      'two results of one reading',
      'manifold',
      ['inBand(manifoldPressure) and outOfBand(manifoldPressure)'],
      [/never holds/],
    ],
    ['not measured, of what was just read', 'settle', ['not measured(gaugeLeft)'], [/never holds/]],
    ['both halves', 'judge', ['cold and warm'], [/never holds/]],
    ['two findings', 'codes-after', ['seals and doesNotSeal'], [/never holds/]],
    [
      'a finding that no run heads for',
      'dipstick',
      ['seals'],
      [/^Step 5, branch 1: is never taken: its condition \(seals\) never holds here/],
    ],
    ['the other way round', 'hold', ['heldFrom > heldTo', 'heldTo < heldFrom'], [/^Step 8, branch 2/]],
    [
      'all three ways',
      'hold',
      ['heldFrom > heldTo', 'heldFrom == heldTo', 'heldFrom < heldTo', 'heldTo > 3 kPa'],
      [/^Step 8, branch 4: .*the branches before it/],
    ],
    ['a sum that cannot be reached', 'hold', ['heldFrom - heldTo > 41 kPa'], [/never holds/]],
    [
      'of two options the second, after the first',
      'still-quiet',
      ['stillQuiet', 'noiseAgain', 'stillQuiet or noiseAgain'],
      [/^Step 9, branch 3/],
    ],
  ])('%s', (_what, step, conditions, messages) => {
    expect(exits(deciding(step, conditions)).errors).toEqual(messages.map((message) => expect.stringMatching(message)));
  });

  it('also where the options of a choice exclude each other', () => {
    const single: [string, (part: Part) => void] = [place('still-quiet'), (part) => delete part['several']];
    expect(exits(deciding('still-quiet', ['stillQuiet and noiseAgain'], single)).errors).toHaveLength(1);
    expect(exits(deciding('still-quiet', ['stillQuiet', 'noiseAgain', 'noiseHeard'], single)).errors).toEqual([
      expect.stringMatching(/^Step 9, branch 3: is never taken: the branches before it/),
    ]);
    // Where several may be chosen, both may be.
    expect(exits(deciding('still-quiet', ['stillQuiet and noiseAgain'])).errors).toEqual([]);
  });
});

describe('a branch that some run can take passes', () => {
  test.each<readonly [what: string, step: string, conditions: readonly string[]]>([
    ['a wider condition behind a narrower one', 'judge', ['noiseHeard and stillQuiet', 'noiseHeard']],
    ['a lower figure behind a higher one', 'settle', ['gaugeLeft > 5 kPa', 'gaugeLeft > 2 kPa']],
    ['the figure itself', 'settle', ['gaugeLeft > 5 kPa', 'gaugeLeft >= 5 kPa']],
    ['the end of what can be believed', 'settle', ['gaugeLeft >= 60 kPa']],
    [
      'each result of a reading, and not judged',
      'manifold',
      [
        'inBand(manifoldPressure)',
        'outOfBand(manifoldPressure)',
        'tooClose(manifoldPressure)',
        'measured(manifoldPressure)',
      ],
    ],
    ['what an earlier reading may have left out', 'judge', ['measured(sealPoint)', 'not measured(sealPoint)']],
    [
      'a rest where something may not have been measured',
      'judge',
      ['sealPoint < 5 kPa', 'sealPoint >= 5 kPa', 'noiseHeard'],
    ],
    ['the other half', 'judge', ['cold', 'warm']],
    ['findings that the run may head for', 'codes-after', ['seals', 'doesNotSeal', 'notCompleted']],
    [
      'a quotient that may have no value',
      'judge',
      ['highestGauge / sealPoint > 2', 'highestGauge / sealPoint <= 2', 'noiseHeard'],
    ],
  ])('%s', (_what, step, conditions) => {
    expect(exits(deciding(step, conditions))).toEqual({ errors: [], warnings: [] });
  });
});

describe('a figure that was left out of both sides is warned of', () => {
  it('with the step', () => {
    expect(exits(deciding('settle', ['gaugeLeft < 5 kPa', 'gaugeLeft > 5 kPa'])).warnings).toEqual([
      'Step 10: of all readings only one that lies exactly on a figure goes on by `otherwise`. Say to which side the figure belongs: write <= or >= in one of the branches.',
    ]);
    expect(exits(deciding('hold', ['heldFrom < heldTo', 'heldTo < heldFrom'])).warnings).toHaveLength(1);
    expect(exits(deciding('judge', ['sealPoint < 5 kPa', 'sealPoint > 5 kPa'])).warnings).toHaveLength(1);
  });

  test.each<readonly [step: string, conditions: readonly string[]]>([
    ['settle', ['gaugeLeft <= 5 kPa', 'gaugeLeft > 5 kPa']],
    ['settle', ['gaugeLeft < 5 kPa']],
    ['settle', ['gaugeLeft < 4 kPa', 'gaugeLeft > 5 kPa']],
    ['judge', ['sealPoint < 5 kPa and noiseHeard', 'sealPoint > 5 kPa']],
    ['judge', ['noiseHeard', 'not noiseHeard']],
  ])('not at %s: %j', (step, conditions) => {
    expect(exits(deciding(step, conditions)).warnings).toEqual([]);
  });
});

describe('a verdict for want of a reading', () => {
  const verdict: Parameters<typeof changedDocument>[1] = [
    `${place('settle')}/otherwise`,
    (exit) => (exit['verdict'] = 'doesNotSeal'),
  ];
  const skipping: Parameters<typeof changedDocument>[1] = [
    `${place('manifold')}/cannotMeasure`,
    (exit) => Object.assign(exit, { to: 'dipstick', because: 'the scan tool shows nothing' }),
  ];

  it('is refused, with the way on which it was not measured', () => {
    expect(exits(deciding('settle', ['manifoldPressure > 90 kPa'], verdict, skipping)).errors).toEqual([
      'Step 10, otherwise: names the finding "Does not seal" also where manifoldPressure could not be measured, on the way 1, 2, 3, 4, 5, 6, 10: branch 1 cannot be told then. Put a branch `not measured(manifoldPressure)` with a way of its own before it.',
    ]);
    expect(exits(deciding('settle', ['inBand(manifoldPressure)'], verdict, skipping)).errors).toHaveLength(1);
    expect(exits(deciding('settle', ['offset > 1 kPa'], verdict, skipping)).errors).toHaveLength(1);
  });

  test.each<readonly [what: string, conditions: readonly string[], changes: readonly (typeof verdict)[]]>([
    ['the exit for it is there', ['not measured(manifoldPressure)', 'manifoldPressure > 90 kPa'], [verdict, skipping]],
    ['no verdict is named', ['manifoldPressure > 90 kPa'], [skipping]],
    ['every way has the reading', ['manifoldPressure > 90 kPa'], [verdict]],
    ['it is the step’s own', ['gaugeLeft > 2 kPa'], [verdict, skipping]],
    [
      'the finding leaves it open',
      ['manifoldPressure > 90 kPa'],
      [[verdict[0], (exit) => (exit['verdict'] = 'notCompleted')], skipping],
    ],
  ])('is none where %s', (_what, conditions, changes) => {
    expect(exits(deciding('settle', conditions, ...changes)).errors).toEqual([]);
  });
});

it('says so where the cases are too many to go through and none was drawn', () => {
  // Ten pairs of which one is seen each, in 2^20 cases; the first branch has taken what the second one needs.
  const sides = ['left', 'right'].map((side) => Array.from({ length: 10 }, (_, index) => `${side}${index}`));
  const lefts = sides[0]?.join(' or ') ?? '';
  const oneOf = (index: number): string => `(left${index} or right${index}) and not (left${index} and right${index})`;
  const pairs = Array.from({ length: 10 }, (_, index) => oneOf(index)).join(' and ');
  const document = deciding(
    'still-quiet',
    [oneOf(9), `(${lefts}) and ${pairs}`],
    [
      place('still-quiet'),
      (part) => (part['options'] as object[]).push(...sides.flat().map((name) => ({ name, label: name }))),
    ],
  );
  expect(exits(document)).toEqual({
    errors: [],
    warnings: [
      'Step 9, branch 2: of 2000 cases that were drawn none takes it, and there are too many to go through. Give a part of the conditions a step of its own.',
    ],
  });
});
