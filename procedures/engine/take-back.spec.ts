import { compileProcedure } from '../document';
import type { InstrumentSnapshot } from '.';
import { RunWalk } from './testing/run-walk';
import { smallProcedure } from './testing/small-procedure';

const scanTool: InstrumentSnapshot = {
  id: 's-3',
  kind: 'scan-tool',
  label: 'S-3',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'absolute', low: 0, high: 400, resolution: 0.1, accuracy: 0.5 }],
};
const gauge: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
};

function atTheRamp(): RunWalk {
  const compiled = compileProcedure(smallProcedure);
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
  return new RunWalk(compiled.procedure)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    )
    .cautions(1)
    .do({ do: 'record', name: 'manifoldPressure', text: '93.9', unit: 'kPa' });
}
const point = (text: string, timeS: number) => ({ do: 'record', name: 'gauge', text, unit: 'kPa', timeS }) as const;

describe('taking back', () => {
  it('lets the newest typed point of a ramp no longer count, and keeps it in the record', () => {
    const walk = atTheRamp();
    while (walk.procedure.step(walk.state.current?.id ?? '')?.kind !== 'listen') walk.do({ do: 'confirm' });
    walk.do(point('0.0', 0), point('0.5', 4), point('10.5', 8));
    walk.do({ do: 'take-back', name: 'gauge', reason: 'slip of the finger' });
    expect(walk.state.current?.takes['gauge']?.map(({ text }) => text)).toEqual(['0.0', '0.5']);
    const [taken, undone] = walk.events.slice(-2);
    expect(taken).toMatchObject({ type: 'reading-recorded', data: { figure: { text: '10.5' } } });
    expect(undone).toMatchObject({ type: 'undone', data: { seq: taken?.seq, reason: 'slip of the finger' } });
  });

  it('says that there is nothing to be taken back yet', () => {
    const walk = atTheRamp();
    expect(walk.ask({ do: 'take-back', name: 'gauge', reason: '' })).toMatchObject({
      ok: false,
      code: 'nothing-taken',
    });
  });
});
