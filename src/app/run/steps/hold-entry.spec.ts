import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { HoldStep } from '../../../../procedures/document';
import type { ClocksNow } from '../hold-clock';
import type { RunView } from '../run-view';
import { valveSeal, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, hasButton, textOf } from '../testing/shown-page';
import { HoldEntry } from './hold-entry';

const step = valveSeal.step('hold-pressure') as HoldStep;

/** A run at the hold, its clock started at 10 s of the run's own time. */
function atTheHold(isStarted: boolean): RunView {
  const view = viewOf(walkedTo('start'));
  const timer = { startedAt: 0, startedElapsed: 10_000, seconds: step.seconds, ended: false, certain: true };
  const current = { ...view.state.current!, id: step.id, timer: isStarted ? timer : undefined };
  return { ...view, state: { ...view.state, current } };
}

async function shown(run: RunView, clocks: ClocksNow) {
  const fixture = TestBed.createComponent(HoldEntry);
  const commands: RunCommand[] = [];
  let tones = 0;
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentInstance.over.subscribe(() => (tones += 1));
  fixture.componentRef.setInput('run', run);
  fixture.componentRef.setInput('step', step);
  const now = { ...clocks };
  fixture.componentRef.setInput('clocks', () => ({ ...now }));
  await fixture.whenStable();
  return { fixture, commands, now, tones: () => tones };
}
const untilTick = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 160));

describe('HoldEntry', () => {
  it('shows the whole time and starts the clock', async () => {
    const { fixture, commands } = await shown(atTheHold(false), { elapsed: 0, loadedElapsed: 0, clockBackMs: 0 });
    expect(textOf(fixture)).toContain('To be held 0:30');
    buttonNamed(fixture, 'Start the clock').click();
    expect(commands).toEqual([{ do: 'start-timer' }]);
  });

  it('shows what is left after a reload, and does not go on before the end', async () => {
    const { fixture } = await shown(atTheHold(true), { elapsed: 22_000, loadedElapsed: 15_000, clockBackMs: 0 });
    expect(textOf(fixture)).toContain('Left to hold 0:18');
    expect(hasButton(fixture, 'Held, go on')).toBe(false);
  });

  it('sounds once at the end, and goes on by a tap', async () => {
    const { fixture, commands, now, tones } = await shown(atTheHold(true), {
      elapsed: 39_950,
      loadedElapsed: 0,
      clockBackMs: 0,
    });
    now.elapsed = 40_000;
    await untilTick();
    now.elapsed = 40_200;
    await untilTick();
    await fixture.whenStable();
    expect(tones()).toBe(1);
    buttonNamed(fixture, 'Held, go on').click();
    expect(commands).toEqual([{ do: 'end-timer', certain: true }]);
  });

  it('says that the time is not certain after the clock was set back while the app was closed, and holds again', async () => {
    const { fixture } = await shown(atTheHold(true), { elapsed: 22_000, loadedElapsed: 15_000, clockBackMs: 60_000 });
    expect(textOf(fixture)).toContain('Time not certain');
    expect(hasButton(fixture, 'Start the clock')).toBe(true);
    expect(hasButton(fixture, 'Held, go on')).toBe(false);
  });
});
