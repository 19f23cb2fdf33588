import { viewOf, walkedTo } from './testing/run-for-specs';
import { waysAhead } from './ways-ahead';

const mainOf = (ways: ReturnType<typeof waysAhead>): string | undefined => ways.find(({ isMain }) => isMain)?.to;

describe('waysAhead', () => {
  it('puts first where a step leads that asks for nothing: the cold half does not warm the engine', () => {
    expect(mainOf(waysAhead(viewOf(walkedTo('start')), undefined))).toBe('key-on');
  });

  it('puts first where the figure that is being typed leads', () => {
    const run = viewOf(walkedTo('sensors-at-rest'));
    expect(mainOf(waysAhead(run, undefined))).toBe('dipstick-out');
    expect(mainOf(waysAhead(run, 'manifold-pressure'))).toBe('manifold-pressure');
  });

  it('has one main way, and each way once', () => {
    const ways = waysAhead(viewOf(walkedTo('sensors-at-rest')), 'manifold-pressure');
    expect(ways.filter(({ isMain }) => isMain)).toHaveLength(1);
    expect(new Set(ways.map(({ to }) => to)).size).toBe(ways.length);
  });

  it('keeps the author\u2019s order for a target that is no way of this step', () => {
    expect(mainOf(waysAhead(viewOf(walkedTo('sensors-at-rest')), 'restore'))).toBe('dipstick-out');
  });
});
