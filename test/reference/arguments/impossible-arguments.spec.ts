import * as fc from 'fast-check';
import * as calculations from '../../../procedures/calculations';
import { between, thousands } from '../properties/runs';
import { type ExportedFunction, type NamedArguments } from './exported-function';
import { exportedFunctions, exportedTables, textFunctions } from './exported-functions';

/** What is no number at all, and what is one that no quantity has. */
const noNumbers: readonly unknown[] = [NaN, Infinity, -Infinity, '1', '', null, true, {}, [], [1], 1n, () => 1];
const noLists: readonly unknown[] = [undefined, null, 5, '12', true, {}];
const noWords: readonly unknown[] = [undefined, null, 5, '', 'toString', ['kPa'], {}];
/** A field of a sample is checked for being finite; its kind is the type's to hold. */
const noFinites: readonly unknown[] = [NaN, Infinity, -Infinity];
/** The seal point's functions do not refuse a first time of -Infinity yet: the one place left out. */
const isEndlessStart = (field: string, index: number, value: unknown): boolean =>
  field === 'timeS' && index === 0 && value === -Infinity;

/** One argument made impossible, and the name that the error has to give. */
interface Poisoned {
  readonly given: NamedArguments;
  readonly name: string;
  readonly value: unknown;
}

function replaced<T>(list: readonly T[], index: number, value: T): T[] {
  return list.map((entry, at) => (at === index ? value : entry));
}

/** Draws valid arguments and makes just one of them impossible. */
function poisonings({ valid, numbers, optional, lists, samples, words }: ExportedFunction): fc.Arbitrary<Poisoned>[] {
  const one = (name: string, values: readonly unknown[]) =>
    fc.tuple(valid, fc.constantFrom(...values)).map(([given, value]) => ({
      given: { ...given, [name]: value },
      name,
      value,
    }));
  const inside = (name: string, values: readonly unknown[], poison: (entry: unknown, value: unknown) => unknown) =>
    fc.tuple(valid, fc.nat(), fc.constantFrom(...values)).map(([given, draw, value]) => {
      const list = given[name] as unknown[];
      const index = draw % list.length;
      return { given: { ...given, [name]: replaced(list, index, poison(list[index], value)) }, name, value, index };
    });
  return [
    ...Object.entries(numbers).map(([name, impossible]) =>
      one(name, [...noNumbers, ...impossible, ...(optional?.includes(name) ? [] : [undefined])]),
    ),
    ...(words ?? []).map((name) => one(name, noWords)),
    ...(lists ?? []).flatMap((name) => [one(name, noLists), inside(name, noNumbers, (_entry, value) => value)]),
    ...Object.entries(samples ?? {}).flatMap(([name, fields]) =>
      fields.map((field) =>
        inside(name, noFinites, (sample, value) => ({ ...(sample as object), [field]: value }))
          .filter(({ index, value }) => !isEndlessStart(field, index, value))
          .map((poisoned) => ({ ...poisoned, name: field })),
      ),
    ),
  ];
}

/** The error of a call; nothing when it gave a result. */
function errorOf(call: () => unknown): unknown {
  try {
    call();
    return undefined;
  } catch (error) {
    return error;
  }
}

/** Every number in a result, however deep. */
function numbersIn(result: unknown): number[] {
  if (typeof result === 'number') return [result];
  return typeof result === 'object' && result !== null ? Object.values(result).flatMap(numbersIn) : [];
}

describe('the table of exported functions', () => {
  it('has every one of them', () => {
    const listed = [...Object.keys(exportedFunctions), ...Object.keys(textFunctions), ...exportedTables];
    expect(listed.sort()).toEqual(Object.keys(calculations).sort());
  });
});

describe.each(Object.entries(exportedFunctions))('%s', (_name, tested) => {
  it('gives finite numbers for every valid argument', () => {
    fc.assert(
      fc.property(tested.valid, (given) => {
        const odd = numbersIn(tested.call(given)).filter((value) => !Number.isFinite(value));
        expect(odd).toEqual([]);
      }),
      { numRuns: 2000 },
    );
  });

  it('refuses each impossible argument with a RangeError that gives its name, value and allowed range', () => {
    fc.assert(
      fc.property(fc.oneof(...poisonings(tested)), ({ given, name, value }) => {
        const error = errorOf(() => tested.call(given));
        if (!(error instanceof RangeError)) throw new Error(`${name} = ${String(value)} gave ${String(error)}`);
        expect(error.message).toMatch(new RegExp(`\\b${name}\\b.* (is|are) `));
        expect(error.message).toContain('; allowed: ');
      }),
      { numRuns: 2000 },
    );
  });
});

describe.each(Object.entries(textFunctions))('%s', (_name, call) => {
  it('answers to any text and never throws', () => {
    const text = fc.oneof(fc.string({ unit: 'binary' }), fc.string({ unit: 'grapheme' }), fc.string({ maxLength: 17 }));
    fc.assert(
      fc.property(text, (given) => {
        expect(errorOf(() => call(given))).toBeUndefined();
      }),
      thousands,
    );
  });
});

describe('parseScanLog', () => {
  const cell = fc.oneof(
    between(-1e12, 1e12).map(String),
    fc.constantFrom('', 'NaN', 'Infinity', '1e999', '-', 'N/A', '12:00:01', '0,5', '1.2.3', 'Time (s)', 'MAP (kPa)'),
    fc.string({ maxLength: 6 }),
  );
  const table = fc
    .tuple(fc.array(fc.array(cell, { maxLength: 5 }), { maxLength: 12 }), fc.constantFrom(',', ';', '\t', ' '))
    .map(([rows, delimiter]) => rows.map((row) => row.join(delimiter)).join('\n'));

  it('never throws on bytes of any kind, nor gives a number that is none', () => {
    fc.assert(
      fc.property(fc.oneof(fc.uint8Array({ maxLength: 200 }), table), (content) => {
        const log = calculations.parseScanLog(content);
        expect(numbersIn(log).every(Number.isFinite)).toBe(true);
        expect(log.values).toHaveLength(log.channels.length);
      }),
      thousands,
    );
  });

  it('reads what it can of a log with rubbish in it', () => {
    fc.assert(
      fc.property(table, (rubbish) => {
        const log = calculations.parseScanLog(`Time (s),MAP (kPa)\n0,93.9\n1,94.0\n${rubbish}`);
        expect(log.channels.length + log.problems.length).toBeGreaterThan(0);
        expect(numbersIn(log).every(Number.isFinite)).toBe(true);
      }),
      thousands,
    );
  });
});
