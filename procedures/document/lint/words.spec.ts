import { lintProcedure } from '../lint';
import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { action, errorsOf, insert, place, type PassingCase, type RefusedCase } from '../testing/lint-cases';

const caution = (text: string, word = 'caution'): object => ({ word, text });

describe('the wording of steps, cautions and notes: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'a caution inside the action',
      rule: 'caution-place',
      message: /^Step 5: "Caution" stands in `action`, .*Move it into `cautions`/,
      changes: [[place('dipstick'), (step) => (step['action'] = 'Pull the dipstick. Caution: hot oil.')]],
    },
    {
      what: 'a caution inside the why',
      rule: 'caution-place',
      message: /^Step 4: "Warning" stands in `why`/,
      changes: [[place('manifold'), (step) => (step['why'] = 'It must agree. Warning: key on wakes motors.')]],
    },
    {
      what: 'a caution inside a reason',
      rule: 'caution-place',
      message: /^Step 5: "be careful" stands in `because`/,
      changes: [[`${place('dipstick')}/otherwise`, (exit) => (exit['because'] = 'it is open; be careful')]],
    },
    {
      what: 'a caution on the step after the act',
      rule: 'caution-place',
      message: /^Step 6: the caution warns of what step 5 does \("Pull the dipstick\."\).*Put it on step 5\./,
      changes: [
        [place('raise'), (step) => (step['cautions'] = [caution('Oil spits. Wait before you pull the dipstick.')])],
      ],
    },
    {
      what: 'a caution two steps late, as a gerund',
      rule: 'caution-place',
      message: /^Step 8: the warning warns of what step 5 does/,
      changes: [
        [
          place('hold'),
          (step) => (step['cautions'] = [caution('Oil is hot. Gloves on before pulling the dipstick.', 'warning')]),
        ],
      ],
    },
    {
      what: 'a caution after the act, as a passive',
      rule: 'caution-place',
      message: /^Step 6: the caution warns of what step 5 does/,
      changes: [
        [place('raise'), (step) => (step['cautions'] = [caution('Wipe the tube before the dipstick is pulled.')])],
      ],
    },
    {
      what: 'work in a caution',
      rule: 'caution-work',
      message: /^Step 4: the caution holds work of the procedure, "Record the value"\. Make that a step/,
      changes: [[`${place('manifold')}/cautions/1`, (part) => (part['text'] = 'It breaks easily. Record the value.')]],
    },
    {
      what: 'something taken apart in a caution',
      rule: 'caution-work',
      message: /^Step 4: the caution holds work of the procedure, "disconnect the battery/,
      changes: [
        [`${place('manifold')}/cautions/1`, (part) => (part['text'] = 'If a motor wakes, disconnect the battery.')],
      ],
    },
    {
      what: 'a step’s own act in a caution',
      rule: 'caution-work',
      message: /^Step 4: the warning holds work of the procedure, "Pull the dipstick first"/,
      changes: [[`${place('manifold')}/cautions/0`, (part) => (part['text'] = 'Pull the dipstick first.')]],
    },
    {
      what: 'work in a caution that holds throughout',
      rule: 'caution-work',
      message: /^The start card: the warning holds work of the procedure, "Connect the scan tool"/,
      changes: [['start/throughout/0', (part) => (part['text'] = 'Motors wake. Connect the scan tool.')]],
    },
    {
      what: 'an imperative in a note',
      rule: 'note-work',
      message: /^Step 5: note 1 asks for something to be done, "Wipe it first"/,
      changes: [[place('dipstick'), (step) => (step['notes'] = ['It lets the crankcase breathe. Wipe it first.'])]],
    },
    {
      what: 'an imperative behind a condition in a note',
      rule: 'note-work',
      message: /^Step 5: note 2 asks for something to be done, "turn it first"/,
      changes: [[place('dipstick'), (step) => (step['notes'] = ['It is long.', 'If it sticks, turn it first.'])]],
    },
    {
      what: 'a prohibition in a note',
      rule: 'note-work',
      message: /^Step 5: note 1 asks for something to be done, "bend it"/,
      changes: [[place('dipstick'), (step) => (step['notes'] = ['Do not bend it.'])]],
    },
    {
      what: 'plus or minus in a text',
      rule: 'two-ends',
      message: /^Step 4: ".*2\.5 ± 1 kPa.*" gives a figure and what it may be off by\. Write the two ends/,
      changes: [[place('manifold'), (step) => (step['why'] = 'It must show 2.5 ± 1 kPa.')]],
    },
    {
      what: 'plus or minus in words, in a limit',
      rule: 'two-ends',
      message: /^Limit ceiling: /,
      changes: [['limits/0', (limit) => (limit['says'] = 'More than 34.5 kPa plus or minus 1 kPa.')]],
    },
    {
      what: 'plus or minus in signs, on the start card',
      rule: 'two-ends',
      message: /^The start card: /,
      changes: [['start/prerequisites', (list) => (list as unknown as string[]).push('Tyres at 220 +/- 10 kPa.')]],
    },
    {
      what: 'a reading that nothing uses',
      rule: 'unused-reading',
      message: /^Step 3a: takes oilTemperature, which has no band and which nothing uses\. Give it a band/,
      changes: [
        ['steps', insert(oilReading())],
        ['steps/0/otherwise', (exit) => (exit['to'] = 'oil')],
      ],
    },
    {
      what: 'an entry that its own way does not use',
      rule: 'unused-reading',
      message: /^Step 3: takes altimeterSetting, .*Let the way’s `is` use it/,
      changes: [[`${place('air')}/reads/0/ways/0`, (way) => (way['is'] = 'standardPressure(elevation)')]],
    },
    {
      what: 'something found in a series that nothing uses',
      rule: 'unused-reading',
      message: /^Step 15: takes gain, which has no band/,
      changes: [[`${place('again')}/finds/0`, (found) => delete found['band']]],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

function oilReading(more: object = {}): object {
  return action('oil', 'codes-before', {
    number: '3a',
    kind: 'reading',
    reads: [{ name: 'oilTemperature', label: 'Oil', unit: 'degC', plausible: { low: -40, high: 200 }, ...more }],
    cannotMeasure: { to: 'codes-before', because: 'it cannot be read' },
  });
}

describe('the wording of steps, cautions and notes: what passes beside it', () => {
  test.each<PassingCase>([
    {
      what: 'a caution lamp in a why',
      changes: [[place('manifold'), (step) => (step['why'] = 'It must agree. Warning lamps may light.')]],
    },
    {
      what: 'a caution on the step that acts',
      changes: [[place('dipstick'), (step) => (step['cautions'] = [caution('Wait before you pull the dipstick.')])]],
    },
    {
      what: 'a caution before the step that acts',
      changes: [
        [
          `${place('manifold')}/cautions/1`,
          (part) => (part['text'] = 'Oil is hot. Wait before you pull the dipstick.'),
        ],
      ],
    },
    {
      what: 'how to avoid the harm',
      changes: [
        [
          `${place('manifold')}/cautions`,
          (list) =>
            Object.assign(list, [
              caution('Air throws off hoses. Keep clear, tie back, take off jewellery. Stop at the smell of fuel.'),
              caution('A plug can fly. Never stand before it; wear goggles.', 'warning'),
              caution('Close the supply when the gauge nears it.', 'notice'),
            ]),
        ],
      ],
    },
    {
      what: 'a note that says what is so',
      changes: [
        [
          place('dipstick'),
          (step) => (step['notes'] = ['Check valves shut late. If it sticks, the tube is bent. Open valves pass air.']),
        ],
      ],
    },
    { what: 'a tolerance of the gear', changes: [['gear/0', (gear) => (gear['label'] = 'Gauge, ±1 % or better')]] },
    {
      what: 'two ends, and what lies either way',
      changes: [
        [place('manifold'), (step) => (step['why'] = 'From 92 kPa to 96 kPa, at most 2 kPa either way, is usual.')],
      ],
    },
    {
      what: 'a reading that a text names',
      changes: [
        ['steps', insert(oilReading())],
        ['steps/0/otherwise', (exit) => (exit['to'] = 'oil')],
        ['steps/1/otherwise', (exit) => (exit['because'] = 'the oil is at {oilTemperature}')],
      ],
    },
    {
      what: 'a reading that a branch asks for',
      changes: [
        ['steps', insert(oilReading())],
        ['steps/0/otherwise', (exit) => (exit['to'] = 'oil')],
        [
          'steps/1',
          (step) => (step['next'] = [{ when: 'oilTemperature > 60 degC', to: 'air', because: 'it is warm' }]),
        ],
      ],
    },
    {
      what: 'a reading that a limit holds',
      changes: [[place('settle'), (step) => (step['until'] = 'itHeld')]],
    },
  ])('$what', ({ changes }) => {
    expect(errorsOf(changedDocument(everyKind, ...changes))).toEqual([]);
  });
});

describe('a sentence with two actions', () => {
  const warnings = (step: string, member: string, text: string): readonly string[] => {
    const document = changedDocument(everyKind, [place(step), (part) => (part[member] = text)]);
    return lintProcedure(document)
      .warnings.filter(({ rule }) => rule === 'one-action')
      .map(({ message }) => message);
  };

  it('is warned of, with the second action', () => {
    expect(warnings('dipstick', 'action', 'Pull the dipstick and wipe it.')).toEqual([
      'Step 5: "Pull the dipstick and wipe it." holds a second action, "wipe it". Make it a step of its own, or one movement with the first ("while").',
    ]);
    expect(warnings('dipstick', 'short', 'Pull the dipstick. Wipe it.')).toHaveLength(1);
  });

  it('is warned of on the stop sheet and where something is put back', () => {
    const document = changedDocument(
      everyKind,
      ['stop', (stop) => (stop['makeSafe'] = ['Close the supply and open the vent.'])],
      [`${place('dipstick')}/disturbs/0`, (disturbed) => (disturbed['restore'] = 'Wipe it, then push it home.')],
    );
    expect(lintProcedure(document).warnings.map(({ pointer }) => pointer)).toEqual([
      '/stop/makeSafe/0',
      `/${place('dipstick')}/disturbs/0/restore`,
    ]);
  });

  it('is not seen in one action', () => {
    expect(warnings('dipstick', 'action', 'Raise the pressure slowly while you listen to hose and joint.')).toEqual([]);
  });
});
