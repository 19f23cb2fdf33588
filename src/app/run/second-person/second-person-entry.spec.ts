import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import type { Colleague, Person, Role } from '../../core/wire';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { stepOf, viewOf } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { SecondPersonEntry } from './second-person-entry';
import { isForSomebody } from './waiting-for';

const people: readonly Colleague[] = [
  { id: 'okafor', displayName: 'I. Okafor', role: 'technician' },
  { id: 'adeyemi', displayName: 'R. Adeyemi', role: 'lead' },
  { id: 'brandt', displayName: 'T. Brandt', role: 'apprentice' },
];
const signedIn = (id: string, role: Role): Person => ({ id, name: id, displayName: id, role, siteId: 's-1' });

async function shown(walk: RunWalk, person: Person) {
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(SecondPersonEntry);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  const inputs = { run: viewOf(walk), step: stepOf(walk, 'action'), people, person };
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  const press = async (name: string): Promise<void> => {
    buttonNamed(fixture, name).click();
    await fixture.whenStable();
  };
  return { fixture, commands, press };
}

describe('SecondPersonEntry', () => {
  it('asks who has looked, and never offers whoever does the step', async () => {
    const walk = roundTo('show');
    const { fixture, commands, press } = await shown(walk, signedIn('okafor', 'technician'));
    expect(hasButton(fixture, 'I. Okafor technician')).toBe(false);
    await press('Has looked');
    expect(textOf(fixture)).toContain('Name above who has looked.');
    expect(commands).toEqual([]);
    await press('T. Brandt apprentice');
    await press('Has looked');
    expect(commands).toEqual([{ do: 'verify', by: 'brandt' }]);
    expect(walk.ask(commands[0]!).ok).toBe(true);
  });

  it('tells a technician whom the run waits for, and releases nothing', async () => {
    const walk = roundTo('show').do({ do: 'verify', by: 'brandt' });
    const { fixture, commands, press } = await shown(walk, signedIn('okafor', 'technician'));
    expect(textOf(fixture)).toContain('The run waits for the lead');
    expect(textOf(fixture)).toContain('A second person has looked: T. Brandt');
    await press('Not released yet');
    expect(commands).toEqual([]);
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toContain('signs in on this tablet');
    expect(elementOf(fixture).querySelector('textarea')).toBeNull();
  });

  it.each(['lead', 'manager'] as const)('lets a %s release it, in words', async (role) => {
    const walk = roundTo('show').do({ do: 'verify', by: 'brandt' });
    const { fixture, commands, press } = await shown(walk, signedIn('adeyemi', role));
    await press('Release');
    expect(commands).toEqual([]);
    const words = elementOf(fixture).querySelector('textarea')!;
    words.value = 'Two clamps, seen.';
    words.dispatchEvent(new Event('input'));
    await fixture.whenStable();
    await press('Release');
    expect(commands).toEqual([{ do: 'release', role, evidence: 'Two clamps, seen.' }]);
    walk.do(commands[0]!);
    fixture.componentRef.setInput('run', viewOf(walk));
    await fixture.whenStable();
    await press('Done, go on');
    expect(commands.at(-1)).toEqual({ do: 'confirm' });
  });

  it('comes where the step has nothing else to enter, and only where the author asked for somebody', () => {
    const at = (id: string): boolean => {
      const walk = roundTo(id);
      const step = walk.procedure.step(id);
      return step !== undefined && isForSomebody(viewOf(walk), step);
    };
    expect([at('show'), at('plug'), at('hold')]).toEqual([true, false, false]);
  });
});
