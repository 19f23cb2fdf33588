import { channelQuantity } from './channel-quantity';

describe('channelQuantity', () => {
  it.each([
    ['MAP', 'manifold-pressure'],
    ['Manifold pressure', 'manifold-pressure'],
    ['intake_manifold_absolute_pressure', 'manifold-pressure'],
    ['map', 'manifold-pressure'],
    ['Boost', 'boost-pressure'],
    ['Charge air pressure', 'boost-pressure'],
    ['Boost pressure', 'boost-pressure'],
    ['gauge', 'gauge-pressure'],
    ['Test pressure', 'gauge-pressure'],
    ['sound', 'sound-level'],
    ['Sound level', 'sound-level'],
    ['Engine coolant temperature', 'coolant-temperature'],
    ['ECT', 'coolant-temperature'],
    ['IAT', 'intake-temperature'],
    ['Intake air temperature', 'intake-temperature'],
    ['RPM', 'engine-speed'],
    ['Engine speed', 'engine-speed'],
    ['engineSpeed', 'engine-speed'],
    ['MAF', 'air-flow'],
    ['Mass air flow', 'air-flow'],
    ['Barometric pressure', 'barometric-pressure'],
  ])('knows %s', (name, quantity) => {
    expect(channelQuantity(name)).toBe(quantity);
  });

  it('keeps silent about what is commanded, unknown or only looks alike', () => {
    const others = [
      'Desired boost pressure',
      'MAP sensor voltage',
      'Boost air temperature',
      'Throttle',
      'Roadmap',
      '',
      'Fuel trim',
    ];
    expect(others.map(channelQuantity)).toEqual(others.map(() => undefined));
  });
});
