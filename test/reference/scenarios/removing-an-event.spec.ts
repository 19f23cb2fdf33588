import { headerHash, replay, sealEvent, type RunEvent, type RunState } from '../../../procedures/engine';
import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('a write-up without one of its events', () => {
  const procedure = compiledValveSeal();
  const walk = driveRun({
    procedure,
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });
  const whole = writeUpTexts(walk);

  /** The run as if the events had never been written, sealed anew; what it says of its own way is a discrepancy. */
  function without(isDropped: (event: RunEvent) => boolean): RunState {
    const kept: RunEvent[] = [];
    for (const { type, data, ...place } of walk.events.filter((event) => !isDropped(event))) {
      const prev = kept.at(-1)?.hash ?? headerHash(walk.header);
      const draft = { type, data } as Parameters<typeof sealEvent>[0];
      kept.push(sealEvent(draft, { ...place, seq: kept.length + 1, prev }));
    }
    expect(kept.length).toBeLessThan(walk.events.length);
    const result = replay(procedure, walk.header, kept);
    if (!result.ok) throw new Error(`${result.refusal.seq}: ${result.refusal.what}`);
    return result.state;
  }

  const reading = (name: string) => (event: RunEvent) => event.type === 'reading-recorded' && event.data.name === name;

  it('says of a sensor that was not read nothing at all', () => {
    const sentence = 'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5)';
    expect(whole.cause).toContain(sentence);
    const rest = writeUpTexts({ procedure, state: without(reading('manifoldPressure')) }).cause;
    expect(rest).not.toContain('94.2');
    expect(rest).not.toContain('manifold pressure was');
    expect(rest).toContain(
      'It stayed quiet for 30 s (step 12a) after the pressure had been raised to 11.8 ± 0.3 kPa (step 11).',
    );
  });

  it('gives no seal point that was not found', () => {
    expect(whole.customer).toContain('3.4 ± 0.3 kPa');
    const texts = writeUpTexts({ procedure, state: without(reading('sealPoint')) });
    expect(`${texts.cause} ${texts.customer}`).not.toMatch(/3\.4|\{/);
  });

  it('does not say that it stayed quiet when nobody said so', () => {
    const state = without((event) => event.type === 'choice-made' && event.data.name === 'quietness');
    expect(whole.cause).toContain('It stayed quiet');
    expect(writeUpTexts({ procedure, state }).cause).not.toContain('stayed quiet');
  });

  it('does not say that codes were cleared when nobody said so', () => {
    const state = without((event) => event.type === 'choice-made' && event.data.name === 'clearing');
    expect(whole.correction).toContain('they were cleared');
    expect(writeUpTexts({ procedure, state }).correction).not.toContain('cleared');
  });

  it('notes the way that no longer follows from what is left', () => {
    const { discrepancies } = without(reading('sealPoint'));
    expect(discrepancies.map(({ what }) => what)).toContain('way on from step 11b');
  });
});
