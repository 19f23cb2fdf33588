import type { ReadQuantity } from '../../../../procedures/document';
import type { InstrumentSnapshot } from '../../../../procedures/engine';
import { entryTarget } from './entry-target';

const gauge: InstrumentSnapshot & { readonly seq: number } = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  dueOn: '2026-12-20',
  seq: 3,
  shows: [
    { unit: 'psi', sense: 'gauge', low: 0, high: 9, resolution: 0.01, accuracy: 0.04 },
    { unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 },
  ],
};
const quantity: ReadQuantity = {
  name: 'gaugeLeft',
  label: 'Gauge after the supply was closed',
  unit: 'kPa',
  sense: 'gauge',
  gear: 'gauge',
  plausible: { low: -5, high: 100 },
};

describe('entryTarget', () => {
  it('asks in the unit of the quantity where the instrument shows it', () => {
    expect(entryTarget({ gear: { gauge } }, quantity, undefined)).toMatchObject({
      unit: 'kPa',
      instrument: { label: 'G-12', resolution: 0.1 },
    });
  });

  it('asks in the unit that the instrument shows where it shows no other', () => {
    const old = { ...gauge, shows: gauge.shows.slice(0, 1) };
    expect(entryTarget({ gear: { gauge: old } }, quantity, undefined)).toMatchObject({
      unit: 'psi',
      instrument: { resolution: 0.01 },
    });
  });

  it('asks without an instrument where none is named', () => {
    const { gear: _gear, ...plain } = quantity;
    expect(entryTarget({ gear: {} }, plain, undefined)).toMatchObject({ unit: 'kPa', instrument: undefined });
  });

  it('asks nothing until a way is chosen, and then what that way asks for', () => {
    const way = {
      id: 'altimeter-setting',
      label: 'Altimeter setting',
      hint: 'As an airfield reports it.',
      entry: { name: 'setting', label: 'Setting', unit: 'hPa', plausible: { low: 870, high: 1085 } },
      is: 'setting',
    } as const;
    const known = { ...quantity, ways: [way] };
    expect(entryTarget({ gear: {} }, known, undefined)).toBeUndefined();
    expect(entryTarget({ gear: {} }, known, way)).toMatchObject({
      label: 'Setting',
      unit: 'hPa',
      hint: 'As an airfield reports it.',
    });
  });

  it('asks nothing where a way needs no entry', () => {
    const way = { id: 'elevation', label: 'Elevation alone', hint: '', is: 'elevation' };
    expect(entryTarget({ gear: {} }, { ...quantity, ways: [way] }, way)).toBeUndefined();
  });
});
