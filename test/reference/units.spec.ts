import { convert, isUnit } from '../../procedures/calculations';
import { checkValues, expectWithin, numberOf, type CheckValue } from './check-values';

const unitsOf = ({ inputs }: CheckValue) => [String(inputs['from']), String(inputs['to'])] as const;

describe('units', () => {
  const all = checkValues('c', 'from', 'to');
  const known = all.filter(([, value]) => unitsOf(value).every(isUnit));

  it.each(known)('%s', (_title, value) => {
    const [from, to] = unitsOf(value);
    if (!isUnit(from) || !isUnit(to)) throw new Error('filtered above');
    expectWithin(value, 'value', convert(numberOf(value.inputs, 'value'), from, to));
  });

  it('leaves out only the units that the product does not use', () => {
    const unknown = new Set(all.flatMap(([, value]) => unitsOf(value).filter((name) => !isUnit(name))));
    expect([...unknown].sort()).toEqual(['Torr', 'inH2O_39.2F', 'inH2O_60F', 'inHg_32F', 'inHg_60F', 'kgf/cm2']);
  });
});
