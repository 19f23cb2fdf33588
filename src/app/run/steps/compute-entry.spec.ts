import { TestBed } from '@angular/core/testing';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { listenedTo, stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { elementOf, textOf } from '../testing/shown-page';
import { ComputeEntry } from './compute-entry';

async function shown(walk: RunWalk) {
  const fixture = TestBed.createComponent(ComputeEntry);
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, 'compute'));
  await fixture.whenStable();
  const lines = [...elementOf(fixture).querySelectorAll('bay-judged-line')];
  return {
    text: textOf(fixture),
    /** The quantities that decide, as they are read out. */
    deciding: lines.map((line) =>
      [...(line.querySelector('p')?.children ?? [])].map((piece) => (piece.textContent ?? '').trim()).join(' '),
    ),
    gauges: lines.map((line) => line.querySelector('bay-band-gauge') !== null),
  };
}

describe('ComputeEntry', () => {
  it('shows the seal point that decides, with its uncertainty and band, and what follows with its number', async () => {
    const { text, deciding, gauges } = await shown(listenedTo(8, { begins: 0.4, stops: 3 }));
    expect(deciding).toEqual([expect.stringMatching(/^Seal point [23]\.\d ± 0\.\d kPa in band$/)]);
    expect(gauges).toEqual([true]);
    expect(text).toMatch(/The noise stopped at [23]\.\d ± 0\.\d kPa above the air of the place\./);
    expect(text).toContain('It goes on with step 12a, hold; the finding so far: seals.');
  });

  it('shows how far it was raised where the noise never stopped', async () => {
    const { text, deciding } = await shown(listenedTo(8, { begins: 0.4 }));
    expect(deciding).toEqual([expect.stringMatching(/^Highest pressure reached 8\.0 ± 0\.3 kPa$/)]);
    expect(text).toMatch(/The noise never stopped, up to 8\.0 ± 0\.3 kPa\./);
    expect(text).toContain('It goes on with step 13, where the air comes out.');
  });

  it('has no figure below zero where the pressure was not raised far enough', async () => {
    const { text, deciding } = await shown(listenedTo(3.4, { begins: 0.4 }));
    expect(deciding).toEqual([expect.stringMatching(/^Highest pressure reached 3\.4 ± 0\.3 kPa$/)]);
    expect(text).toMatch(/The pressure reached 3\.4 ± 0\.3 kPa only: it was not raised far enough to say\./);
    expect(text).not.toMatch(/[-\u2212]\d/);
  });

  it('shows a result with its formula and, first, what the rule that holds reads', async () => {
    const { text, deciding } = await shown(walkedTo('sensors-at-rest'));
    expect(text).toContain('Manifold pressure 94.2 kPa \u2212 Boost pressure 94.1 kPa');
    expect(deciding.map((line) => line.replace(/ [\d.]+ ±.*/, ''))).toEqual([
      'Manifold minus boost',
      'Manifold pressure',
      'Boost pressure',
    ]);
    expect(text).toContain('It goes on with step 7, dipstick out.');
  });
});
