import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { HonestWay } from '../frame/honest-ways';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, hasButton, textOf } from '../testing/shown-page';
import { WayOutSheet } from './way-out-sheet';

async function shown(stepId: string, way: HonestWay) {
  const walk = walkedTo(stepId);
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(WayOutSheet);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', walk.procedure.step(stepId));
  fixture.componentRef.setInput('way', way);
  await fixture.whenStable();
  return { walk, fixture, commands };
}

describe('WayOutSheet', () => {
  it('names the exit that the author wrote before it is taken', async () => {
    const { fixture } = await shown('cold-enough', 'cannot-measure');
    const text = textOf(fixture);
    expect(text).toContain('Goes on with Finding, Not completed');
    expect(text).toContain('nobody can say that the engine is cold');
  });

  it('takes a usual reason by a tap', async () => {
    const { walk, fixture, commands } = await shown('cold-enough', 'cannot-measure');
    buttonNamed(fixture, 'The instrument fails').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Cannot measure, go on').click();
    expect(commands).toEqual([{ do: 'cannot-measure', reason: 'The instrument fails' }]);
    expect(walk.do(commands[0]!).state.finding).toBe('notCompleted');
  });

  it('says beside the field that a reason is missing', async () => {
    const { walk, fixture, commands } = await shown('cold-enough', 'cannot-measure');
    buttonNamed(fixture, 'Cannot measure, go on').click();
    fixture.componentRef.setInput('problem', walk.ask(commands[0]!));
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('Say in a few words why it cannot be measured.');
  });

  it('says what to do instead where nothing is measured', async () => {
    const { fixture } = await shown('key-on', 'cannot-measure');
    expect(textOf(fixture)).toContain('Nothing is measured in this step.');
    expect(hasButton(fixture, 'Cannot measure, go on')).toBe(false);
  });

  it('makes the car safe before the lead is asked', async () => {
    const { walk, fixture, commands } = await shown('key-on', 'not-sure');
    expect(textOf(fixture)).toContain('First make the car safe Close the supply.');
    buttonNamed(fixture, 'Is it safe to go on?').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Make safe, ask the lead').click();
    expect(walk.do(commands[0]!).state).toMatchObject({
      status: 'lead-called',
      pause: { reason: 'Is it safe to go on?' },
    });
  });

  it('sets the run aside without a reason too', async () => {
    const { walk, fixture, commands } = await shown('key-on', 'set-aside');
    buttonNamed(fixture, 'Set aside').click();
    expect(walk.do(commands[0]!).state.status).toBe('set-aside');
  });

  it('lets a step be said not to apply, with a reason, also where nothing is measured', async () => {
    const { walk, fixture, commands } = await shown('key-on', 'cannot-measure');
    buttonNamed(fixture, 'It does not apply to this car').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Does not apply, go on').click();
    expect(walk.ask(commands[0]!)).toMatchObject({ ok: false, code: 'say-why' });
    buttonNamed(fixture, 'The car does not have this part').click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Does not apply, go on').click();
    expect(commands.at(-1)).toEqual({ do: 'not-applicable', reason: 'The car does not have this part' });
    walk.do(commands.at(-1)!);
    expect(walk.state.current?.id).not.toBe('key-on');
  });

  it('never says so of what puts back or begins', async () => {
    const { fixture } = await shown('start', 'cannot-measure');
    expect(hasButton(fixture, 'It does not apply to this car')).toBe(false);
  });
});
