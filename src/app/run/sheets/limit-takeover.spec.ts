import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, hasButton, textOf } from '../testing/shown-page';
import { LimitTakeover } from './limit-takeover';

const overTheLimit = (): RunWalk =>
  walkedTo('raise-and-listen').do(
    { do: 'record', name: 'gauge', text: '0.0', unit: 'kPa', timeS: 0 },
    { do: 'record', name: 'gauge', text: '40', unit: 'kPa', timeS: 4 },
  );

async function shown(walk: RunWalk) {
  const fixture = TestBed.createComponent(LimitTakeover);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('alarm', walk.state.alarm);
  await fixture.whenStable();
  return { fixture, commands };
}

describe('LimitTakeover', () => {
  it('stops the run from under the alarm', async () => {
    const walk = overTheLimit();
    const { fixture, commands } = await shown(walk);
    buttonNamed(fixture, 'Stop, supply off').click();
    expect(commands).toEqual([{ do: 'stop', reason: '' }]);
    walk.do(commands[0]!);
    expect(walk.state.status).toBe('stopped');
  });

  it('says that it is stopped, and leads on to making the car safe', async () => {
    const walk = overTheLimit().do({ do: 'stop', reason: '' });
    const { fixture, commands } = await shown(walk);
    expect(hasButton(fixture, 'Stop, supply off')).toBe(false);
    expect(textOf(fixture)).toContain('Stopped. What makes the car safe comes next.');
    buttonNamed(fixture, 'It is done: make the car safe').click();
    walk.do(commands[0]!);
    expect(walk.state.alarm).toBeUndefined();
    expect(walk.state.status).toBe('stopped');
  });
});
