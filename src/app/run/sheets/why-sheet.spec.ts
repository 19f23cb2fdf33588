import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, textOf } from '../testing/shown-page';
import { WhySheet } from './why-sheet';

async function shown(walk: RunWalk) {
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(WhySheet);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  await fixture.whenStable();
  return { fixture, commands };
}
/** Manifold pressure so near the band's edge that it is read again. */
const tooClose = (): RunWalk =>
  walkedTo('manifold-pressure').do({ do: 'record', name: 'manifoldPressure', text: '96.1', unit: 'kPa' });

describe('WhySheet', () => {
  it('shows the rule, what it used, the reason, and where it led', async () => {
    const { fixture } = await shown(tooClose());
    const text = textOf(fixture);
    expect(text).toContain('From step 5, Manifold pressure, key on');
    expect(text).toContain('The rule tooClose(manifoldPressure)');
    expect(elementOf(fixture).querySelector('tr')?.textContent).toMatch(/Manifold pressure\s*96\.1 ± 0\.6 kPa/);
    expect(text).toContain('It leads to step 5');
  });

  it('says which it was where no rule decided', async () => {
    const chosen = tooClose().do({ do: 'overrule', exit: 'otherwise', reason: 'seen' });
    const cases = [walkedTo('boost-pressure'), walkedTo('flow-open'), chosen];
    const texts: string[] = [];
    for (const walk of cases) {
      texts.push(textOf((await shown(walk)).fixture));
      TestBed.resetTestingModule();
    }
    expect(texts[0]).toContain('No other rule of this step held.');
    expect(texts[1]).toContain('The author gave this step one way only.');
    expect(texts[2]).toContain('A person chose this way instead of the one that the rules led to.');
  });

  it('offers the author\u2019s other ways, and takes one with a reason', async () => {
    const { fixture, commands } = await shown(tooClose());
    buttonNamed(fixture, 'This does not fit: take another way').click();
    await fixture.whenStable();
    const ways = [...elementOf(fixture).querySelectorAll<HTMLButtonElement>('[role=radio]')];
    const boost = ways.find((way) => way.textContent?.includes('6, Boost pressure'));
    boost?.click();
    await fixture.whenStable();
    buttonNamed(fixture, 'The rule does not fit this car').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Take it').click();
    expect(commands).toMatchObject([{ do: 'overrule', reason: 'The rule does not fit this car' }]);
    const walk = tooClose().do(commands[0]!);
    expect(walk.state.current?.id).toBe('boost-pressure');
    expect(walk.events.find(({ type }) => type === 'branch-overruled')).toBeDefined();
  });

  it('says what is missing beside what cannot be taken yet', async () => {
    const { fixture, commands } = await shown(tooClose());
    buttonNamed(fixture, 'This does not fit: take another way').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Take it').click();
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toBe('Choose one of the ways above first.');
    elementOf(fixture).querySelector<HTMLButtonElement>('[role=radio]')?.click();
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toBe('Say why this is right first.');
    buttonNamed(fixture, 'Take it').click();
    expect(commands).toEqual([]);
    buttonNamed(fixture, 'The rule does not fit this car').click();
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('[role=alert]')).toBeNull();
  });
});
