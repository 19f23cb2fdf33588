import { furtherImperatives, imperativesIn, isConditional, sentencesOf } from './imperatives';

const verbs = (sentence: string): readonly string[] => imperativesIn(sentence).map(({ verb }) => verb);

describe('what a sentence asks for', () => {
  test.each([
    ['Open the vent.', ['open']],
    ['Wait for the gauge to show zero.', ['wait']],
    ['Slowly raise the pressure.', ['raise']],
    ['Do not open the cap.', ['open']],
    ['Never leave the car.', ['leave']],
    ['Open the vent, then close the supply.', ['open', 'close']],
    ['Disconnect the hose and plug the port.', ['disconnect', 'plug']],
    ['If the gauge stays up, open the vent.', ['open']],
    ['When it is cold, remove the cap and look at the seat.', ['remove', 'look']],
    ['One rule holds: keep the vent open.', ['keep']],
    ['Press and hold the button.', ['press']],
    ['Say whether it stayed quiet.', ['say']],
    ['Set {target} at the regulator.', ['set']],
    ['Turn off the key.', ['turn']],
  ] as const)('%s', (sentence, expected) => {
    expect(verbs(sentence)).toEqual(expected);
  });
});

describe('what only states something asks for nothing', () => {
  test.each([
    'Check valves shut at low pressure.',
    'Open valves pass air.',
    'The valve opens and the noise begins.',
    'A pull under boost, then a steady ride.',
    'Plug and cap belong together.',
    'Clean dry air is enough.',
    'Technicians remove and refit it often.',
    'If the gauge stays up, the vent lets the rest out.',
    'Air from the dipstick tube names no part.',
    'Cold, the noise stops later.',
    'Light load at one speed, as the road allows.',
    'Seal point and target are two figures.',
    'Work on the car is left to others.',
    'It moves, say, 2 mm.',
    'The reading is 2.5 kPa. That is enough.',
    '',
  ])('%s', (text) => {
    expect(sentencesOf(text).flatMap(verbs)).toEqual([]);
  });
});

describe('a second action', () => {
  test.each([
    ['Close the supply and open the vent.', 'open the vent'],
    ['Close the supply, then open the vent.', 'open the vent'],
    ['Close the supply, open the vent.', 'open the vent'],
    ['Remove the clamp and reconnect the hose.', 'reconnect the hose'],
    ['Eyeball the hose and tighten its clamp.', 'tighten its clamp'],
    ['Start the engine and let it idle.', 'let it idle'],
    ['Pull the plug, then slowly turn the crankshaft.', 'turn the crankshaft'],
    ['Switch the lamp on and look at the seat.', 'look at the seat'],
  ])('%s', (sentence, second) => {
    expect(furtherImperatives(sentence).map(({ words }) => words)).toEqual([second]);
  });
});

describe('one action, however many words', () => {
  test.each([
    'Press and hold the button.',
    'Push and turn the cap.',
    'Look over brakes, steering, tyres, lights and fluid levels.',
    'Compare manifold and boost pressure.',
    'Turn the crankshaft by hand, key off, until no intake valve stands open at overlap.',
    'Listen with the probe along the manifold and the duct.',
    'Fit plug and cap.',
    'Check hose and clamp for cracks.',
    'Raise the pressure slowly towards 10 kPa while you listen.',
    'Open the flow valve and vent by half a turn.',
    'Read oil level, coolant level and brake fluid.',
    'Wait until pressure and temperature rest.',
  ])('%s', (sentence) => {
    expect(furtherImperatives(sentence)).toEqual([]);
  });
});

it('cuts a text into sentences, not into figures', () => {
  expect(sentencesOf('Hold 34.5 kPa. Then wait; look at it!')).toEqual(['Hold 34.5 kPa.', 'Then wait;', 'look at it!']);
});

it('knows a condition', () => {
  expect(isConditional('Close the supply when the gauge nears it.')).toBe(true);
  expect(isConditional('Close the supply.')).toBe(false);
});
