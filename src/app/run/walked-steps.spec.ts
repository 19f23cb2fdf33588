import { listenedTo, walkedTo } from './testing/run-for-specs';
import { latestValue } from './walked-steps';

describe('latestValue', () => {
  it('is the reading that was taken last', () => {
    expect(latestValue(walkedTo('boost-pressure'))?.name).toBe('manifoldPressure');
  });

  it('is a result where a step judges one', () => {
    expect(latestValue(walkedTo('dipstick-out'))?.name).toBe('sensorGap');
  });

  it('is the seal point after a ramp that has one, and how far it was raised after one that has none', () => {
    expect(latestValue(listenedTo(8, { begins: 0.4, stops: 3 }))?.name).toBe('sealPoint');
    expect(latestValue(listenedTo(8, { begins: 0.4 }))?.name).toBe('highestGauge');
  });

  it('stays what was read when a step only works something out, with no band to judge it by', () => {
    const walk = listenedTo(8, { begins: 0.4 }).do({ do: 'confirm' }, { do: 'acknowledge-caution', caution: 0 });
    walk.do({ do: 'choose', options: ['airAtValve'] }, { do: 'confirm' });
    expect(walk.state.current?.id).toBe('supply-off');
    expect(latestValue(walk)?.name).toBe('highestGauge');
  });
});
