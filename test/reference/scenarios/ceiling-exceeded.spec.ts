import { composeWriteUp } from '../../../procedures/engine';
import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { importOf, readRamp, withChannel } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';

/** Three times the pressure of the ramp: up to 35.4 kPa. */
const overshot = withChannel(readRamp('demo-warm-seals'), 'gauge', (gaugeKpa) => 3 * gaugeKpa);

describe('crankcase valve seal, cold half: the series went over the ceiling', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      [
        '11',
        {
          commands: [
            { do: 'acknowledge-caution', caution: 0 },
            { do: 'acknowledge-caution', caution: 1 },
            importOf(overshot, 'ramp.csv'),
            { do: 'stop', reason: 'the gauge went past its ceiling' },
            { do: 'acknowledge-limit' },
            { do: 'leave-stop', how: 'not-completed' },
          ],
        },
      ],
      ...gaugeAtZero,
      ['18a', { codes: [] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 15a 15b 15c 16 18a F12');
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('notCompleted');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('says in the write-up what went over the ceiling, and finds nothing in that series', () => {
    expect(composeWriteUp(walk.procedure, walk.state).cause.text).toMatch(
      /At step 11 the limit was exceeded, 35\.4 kPa; that was not used\.$/,
    );
    expect(walk.state.series['ramp']).toBeUndefined();
    expect(walk.state.values['sealPoint']).toBeUndefined();
  });

  it('keeps the highest value with the limit that it broke', () => {
    const exceeded = walk.events.find(({ type }) => type === 'limit-exceeded');
    expect(exceeded?.data).toMatchObject({
      limit: 'pressure-ceiling',
      name: 'gauge',
      figure: { text: '35.4', unit: 'kPa' },
    });
  });
});
