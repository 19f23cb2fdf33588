import { TestBed } from '@angular/core/testing';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, textOf } from '../testing/shown-page';
import { ResumeCard } from './resume-card';

async function shown(walk: RunWalk) {
  const fixture = TestBed.createComponent(ResumeCard);
  const answers: string[] = [];
  fixture.componentInstance.resumed.subscribe(() => answers.push('go on'));
  fixture.componentInstance.repeated.subscribe((step) => answers.push(`repeat ${step}`));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('now', walk.state.lastAt + 6 * 60_000);
  fixture.componentRef.setInput('clocks', { elapsed: walk.events.length * 1000, loadedElapsed: 0, clockBackMs: 0 });
  await fixture.whenStable();
  return { fixture, answers };
}

describe('ResumeCard', () => {
  it('shows the step done last with its value, the current one, and what is disturbed', async () => {
    const { fixture } = await shown(walkedTo('boost-pressure'));
    const text = textOf(fixture);
    expect(text).toContain('Last entry 6 min ago');
    expect(text).toMatch(/Done last: step 5 Read manifold pressure on the scan tool\. Manifold pressure 94\.2 kPa/);
    expect(text).toContain('Now: step 6 Read boost pressure on the scan tool.');
    expect(text).toContain('Nothing is disturbed');
  });

  it('shows the last value where the last step had none, and names what is apart', async () => {
    const { fixture } = await shown(walkedTo('duct-off'));
    expect(textOf(fixture)).toContain('Recorded last, step 6a Manifold minus boost 0.1 kPa');
    expect(textOf(fixture)).toContain('Disturbed, not yet put back dipstick');
  });

  it('offers to repeat the last step first', async () => {
    const { fixture, answers } = await shown(walkedTo('boost-pressure'));
    const buttons = [...elementOf(fixture).querySelectorAll('button')].map((button) => button.textContent?.trim());
    expect(buttons[0]).toMatch(/^Repeat step 5/);
    buttonNamed(fixture, 'Repeat step 5 Manifold pressure, key on').click();
    buttonNamed(fixture, 'Go on with step 6 Boost pressure, key on').click();
    expect(answers).toEqual(['repeat manifold-pressure', 'go on']);
  });

  it('says why and since when the run was set aside', async () => {
    const walk = walkedTo('boost-pressure').do({ do: 'set-aside', reason: 'Phone call' });
    const { fixture } = await shown(walk);
    expect(textOf(fixture)).toContain('Set aside 6 min ago: Phone call');
  });

  it('keeps the car safe in view while the lead is asked', async () => {
    const walk = walkedTo('boost-pressure').do({ do: 'not-sure', question: 'Is this the right part?' });
    const { fixture } = await shown(walk);
    expect(textOf(fixture)).toContain('The lead is asked');
    expect(textOf(fixture)).toContain('Make the car safe meanwhile Close the supply.');
  });
});
