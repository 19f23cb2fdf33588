import type { Step } from '../../procedures/document';
import type { RunCommand, Series } from '../../procedures/engine';
import { RunWalk } from '../../procedures/engine/testing/run-walk';
import { compiledValveSeal } from './compiled-valve-seal';
import { fineGear } from './ossenholt-gear';
import { importOf } from './ramp-file';

/*
 * Ways through the valve seal procedure that nobody authored a test for: right and wrong answers, stops, pauses and
 * calls, all drawn from a list of numbers, so that a run can be walked again.
 */

const procedureUnderTest = compiledValveSeal();

/** What a sound car shows on an ordinary day, so that most walks get past the first readings. Figures invented. */
const usualFigures: Readonly<Record<string, number>> = {
  altimeterSetting: 1013.3,
  barometerPressure: 93.9,
  manifoldPressure: 94,
  boostPressure: 93.8,
  gaugeLeft: 0,
};

type Choose = (count: number) => number;

const quiet: Series = {
  timeS: [0, 10, 20, 30],
  channels: [
    { name: 'gauge', unit: 'kPa', values: [0, 2, 4, 7] },
    { name: 'manifold', unit: 'kPa', values: [93.9, 95.9, 97.9, 100.9] },
    { name: 'boost', unit: 'kPa', values: [93.9, 95.8, 97.9, 100.8] },
  ],
};

/** Something that a person could do at a step, right or wrong. */
function answersAt(step: Step, walk: RunWalk, choose: Choose): readonly RunCommand[] {
  switch (step.kind) {
    case 'start':
      return [
        ...Object.entries(fineGear).map(([role, instrument]): RunCommand => ({
          do: 'choose-gear',
          role,
          instrument,
        })),
        { do: 'confirm' },
      ];
    case 'action':
    case 'compute':
    case 'call':
      return [{ do: 'confirm' }];
    case 'reading':
    case 'wait':
      return step.reads.flatMap((quantity): RunCommand[] => {
        const way = quantity.ways?.[choose(quantity.ways.length)];
        const { low, high } = way?.entry?.plausible ?? quantity.plausible;
        const usual = usualFigures[way?.entry?.name ?? quantity.name];
        const value = usual !== undefined && choose(6) > 0 ? usual : low + ((high - low) * choose(101)) / 100;
        const text = value.toFixed(1);
        const unit = way?.entry?.unit ?? quantity.unit;
        const take: RunCommand = {
          do: 'record',
          name: quantity.name,
          text,
          unit,
          ...(way === undefined ? {} : { way: way.id }),
        };
        return Array.from({ length: quantity.takes ?? 1 }, () => take);
      });
    case 'choice':
      return [{ do: 'choose', options: [step.options[choose(step.options.length)]!.name], text: 'as seen' }];
    case 'drive':
      return [
        { do: 'choose', options: step.windows.slice(0, choose(step.windows.length + 1)).map(({ name }) => name) },
      ];
    case 'ramp':
    case 'listen': {
      const marks: RunCommand[] = [
        { do: 'mark', mark: 'noise-begins', timeS: 2, by: 'tap' },
        { do: 'mark', mark: 'noise-stops', timeS: 5 + choose(24), by: 'tap' },
      ];
      return [importOf(quiet, 'ramp.csv'), ...marks.slice(0, choose(3)), { do: 'finish-listening', series: quiet }];
    }
    case 'hold':
      return [{ do: 'start-timer' }, { do: 'end-timer', certain: true }];
    case 'codes':
      return [{ do: 'record-codes', codes: choose(2) === 0 ? [] : [{ code: 'P0068', status: 'stored' }] }];
    case 'restore':
      return walk.state.disturbed.length === 0
        ? [{ do: 'confirm' }]
        : walk.state.disturbed.map(({ item }) => ({ do: 'restore', item }));
    case 'photo':
    case 'finding':
      return [];
  }
}

function detour(choose: Choose): readonly RunCommand[] {
  return [
    [
      { do: 'stop', reason: '' },
      { do: 'leave-stop', how: 'go-back' },
    ],
    [
      { do: 'stop', reason: 'a hose moved' },
      { do: 'leave-stop', how: 'not-completed' },
    ],
    [{ do: 'set-aside', reason: 'phone call' }, { do: 'resume' }],
    [{ do: 'cannot-measure', reason: 'no light' }],
    [{ do: 'not-sure', question: 'is this the port?' }, { do: 'resume' }],
  ][choose(5)] as readonly RunCommand[];
}

/** A run to its finding, not closed, by the choices (any numbers from 0), which are used over again when they run out. */
export function walkAtRandom(half: 'cold' | 'warm', choices: readonly number[]): RunWalk {
  let next = 0;
  const choose: Choose = (count) => (choices[next++ % choices.length] ?? 0) % count;
  const walk = new RunWalk(procedureUnderTest, { half });
  for (let steps = 0; walk.state.current !== undefined; steps += 1) {
    if (steps > 600) throw new Error('the run does not come to an end');
    const step = procedureUnderTest.step(walk.state.current.id)!;
    const count = step.kind === 'start' ? procedureUnderTest.document.start.throughout.length : 0;
    walk.cautions(count + (step.cautions?.length ?? 0));
    const commands = choose(12) === 0 && step.kind !== 'start' ? detour(choose) : answersAt(step, walk, choose);
    for (const command of commands) {
      if (walk.state.alarm !== undefined) walk.do({ do: 'acknowledge-limit' });
      const outcome = walk.ask(command);
      if (outcome.ok) walk.do(command);
      if (walk.state.current?.id !== step.id) break;
    }
    if (walk.state.current?.id === step.id && steps % 7 === 6) {
      const outcome = walk.ask({ do: 'cannot-measure', reason: 'it cannot be read' });
      if (outcome.ok) walk.do({ do: 'cannot-measure', reason: 'it cannot be read' });
    }
  }
  return walk;
}
