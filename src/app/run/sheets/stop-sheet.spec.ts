import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, textOf } from '../testing/shown-page';
import { StopSheet } from './stop-sheet';

async function shown() {
  const walk = walkedTo('raise-and-listen').do({ do: 'stop', reason: '' });
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(StopSheet);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  await fixture.whenStable();
  return { walk, fixture, commands };
}

describe('StopSheet', () => {
  it('says how the car is made safe before it asks why', async () => {
    const text = textOf((await shown()).fixture);
    expect(text.indexOf('Close the supply.')).toBeGreaterThan(-1);
    expect(text.indexOf('Close the supply.')).toBeLessThan(text.indexOf('Then say why'));
  });

  it('says what ending the test still waits for, and why it was refused', async () => {
    const { walk, fixture, commands } = await shown();
    expect(textOf(fixture)).toContain('To end as not completed, say why.');
    buttonNamed(fixture, 'End as not completed goes to 15a, Supply off').click();
    fixture.componentRef.setInput('problem', walk.ask(commands[0]!));
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('Say in a few words why the test ends here.');
  });

  it('ends the test with a usual reason by a tap', async () => {
    const { walk, fixture, commands } = await shown();
    buttonNamed(fixture, 'A part moved or came loose').click();
    await fixture.whenStable();
    expect(textOf(fixture)).not.toContain('To end as not completed, say why.');
    buttonNamed(fixture, 'End as not completed goes to 15a, Supply off').click();
    expect(walk.do(commands[0]!).state.verdict).toBe('notCompleted');
    expect(walk.state.walked.find(({ way }) => way?.exit === 'stop')?.way?.reason).toBe('A part moved or came loose');
  });

  it('goes back without a reason', async () => {
    const { walk, fixture, commands } = await shown();
    buttonNamed(fixture, 'Back to step 11').click();
    expect(walk.do(commands[0]!).state).toMatchObject({ status: 'open', current: { id: 'raise-and-listen' } });
  });
});
