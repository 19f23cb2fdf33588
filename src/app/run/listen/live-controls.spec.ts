import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { RampQueue } from '../ramp-queue';
import type { ListenDone } from './listen-requests';
import { LiveControls } from './live-controls';
import { seriesOfTakes } from './live-series';

interface Shown {
  readonly walk: RunWalk;
  readonly fixture: ComponentFixture<LiveControls>;
  readonly commands: RunCommand[];
  readonly done: ListenDone[];
  /** Sets the run's monotonic time, seconds after the first point. */
  at(seconds: number): void;
}

async function shown(): Promise<Shown> {
  const walk = walkedTo('raise-and-listen');
  const fixture = TestBed.createComponent(LiveControls);
  const commands: RunCommand[] = [];
  const done: ListenDone[] = [];
  let seconds = 0;
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentInstance.finished.subscribe((request) => done.push(request));
  fixture.componentRef.setInput('aim', { label: 'Gauge', unit: 'kPa', target: 10, ceiling: '34.5' });
  fixture.componentRef.setInput('elapsed', () => (walk.events.length + 1) * 1000 + seconds * 1000);
  await refresh(fixture, walk);
  const first = walk.events.length + 1;
  fixture.componentRef.setInput('elapsed', () => first * 1000 + seconds * 1000);
  return { walk, fixture, commands, done, at: (s) => (seconds = s) };
}

async function refresh(fixture: ComponentFixture<LiveControls>, walk: RunWalk): Promise<void> {
  const step = stepOf(walk, 'listen');
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', step);
  fixture.componentRef.setInput('series', seriesOfTakes(step, walk.state.current?.takes ?? {}));
  await fixture.whenStable();
}

/** Taps a button and lets the run do what it asks for. */
async function tap({ walk, fixture, commands }: Shown, name: string): Promise<void> {
  buttonNamed(fixture, name).click();
  const command = commands.at(-1);
  if (command !== undefined) walk.do(command);
  await refresh(fixture, walk);
}

describe('LiveControls', () => {
  it('begins at zero, and then takes one point a tap with its time', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    expect(page.commands.at(-1)).toEqual({ do: 'record', name: 'gauge', text: '0.0', unit: 'kPa', timeS: 0 });
    page.at(4.2);
    await tap(page, '+ 0.5');
    expect(page.commands.at(-1)).toEqual({ do: 'record', name: 'gauge', text: '0.5', unit: 'kPa', timeS: 4.2 });
    expect(elementOf(page.fixture).querySelector('.figure .num')?.textContent).toBe('0.5');
  });

  it('marks where the noise begins and where it stops, then judges the seal point', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(5);
    await tap(page, '+ 1');
    await tap(page, 'The noise begins');
    for (const second of [10, 15, 20]) {
      page.at(second);
      await tap(page, '+ 1');
    }
    page.at(22);
    await tap(page, 'The noise stopped');
    expect(page.commands.at(-1)).toEqual({ do: 'mark', mark: 'noise-stops', timeS: 22, by: 'tap' });
    expect(textOf(page.fixture)).toContain('Raise on, and tap one more point');
    expect(buttonNamed(page.fixture, 'Keep the mark and go on').getAttribute('aria-disabled')).toBe('true');
    page.at(25);
    await tap(page, '+ 1');
    expect(textOf(page.fixture)).toMatch(/Seal point .*4\.\d ± \d\.\d kPa/);
    buttonNamed(page.fixture, 'Keep the mark and go on').click();
    expect(page.done).toMatchObject([{ marks: [], series: { timeS: [0, 5, 10, 15, 20, 25] } }]);
  });

  it('takes a mark away again', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(3);
    await tap(page, 'The noise begins');
    await tap(page, 'Take the mark away');
    expect(page.walk.state.series['ramp']?.marks ?? {}).toEqual({});
    expect(hasButton(page.fixture, 'The noise begins')).toBe(true);
  });

  it('undoes the last point', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(4);
    await tap(page, '+ 1');
    await tap(page, 'Undo last point');
    expect(page.commands.at(-1)).toMatchObject({ do: 'take-back', name: 'gauge' });
    expect(elementOf(page.fixture).querySelector('.figure .num')?.textContent).toBe('0.0');
  });

  it('does not take no noise, or one that never stopped, before there is a ramp', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    expect(buttonNamed(page.fixture, 'No noise at all').disabled).toBe(true);
    page.at(4);
    await tap(page, '+ 1');
    page.at(8);
    await tap(page, '+ 1');
    for (const ending of ['No noise at all', 'It never stopped']) {
      const before = page.done.length;
      buttonNamed(page.fixture, ending).click();
      await page.fixture.whenStable();
      expect(page.done).toHaveLength(before);
      buttonNamed(page.fixture, `Sure? ${ending}`).click();
      await page.fixture.whenStable();
    }
    expect(page.done).toMatchObject([{ marks: [] }, { marks: [{ mark: 'noise-begins', timeS: 0, by: 'tap' }] }]);
  });

  it('asks before it ends the ramp, and goes back from the question', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    for (const second of [4, 8]) {
      page.at(second);
      await tap(page, '+ 1');
    }
    buttonNamed(page.fixture, 'It never stopped').click();
    await page.fixture.whenStable();
    buttonNamed(page.fixture, 'Leave it').click();
    await page.fixture.whenStable();
    expect(hasButton(page.fixture, 'Sure? It never stopped')).toBe(false);
    buttonNamed(page.fixture, 'It never stopped').click();
    await page.fixture.whenStable();
    page.at(12);
    await tap(page, '+ 1');
    expect(hasButton(page.fixture, 'Sure? It never stopped')).toBe(false);
    expect(page.done).toEqual([]);
  });

  it('begins the ramp anew, once that is confirmed', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(4);
    await tap(page, '+ 1');
    buttonNamed(page.fixture, 'Begin anew').click();
    await page.fixture.whenStable();
    await tap(page, 'Sure? Begin anew');
    expect(page.commands.at(-1)).toEqual({
      do: 'redo',
      step: 'raise-and-listen',
      reason: 'the ramp is begun anew',
    });
    expect(page.walk.state.current?.id).toBe('raise-and-listen');
    expect(page.walk.state.current?.takes['gauge'] ?? []).toEqual([]);
    expect(page.walk.state.series['ramp']).toBeUndefined();
  });

  it('stands at zero again after a limit, and counts its time anew', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(4);
    await tap(page, 'The noise begins');
    page.walk.do({ do: 'record', name: 'gauge', text: '40', unit: 'kPa', timeS: 8 }, { do: 'acknowledge-limit' });
    page.at(9);
    await refresh(page.fixture, page.walk);
    expect(elementOf(page.fixture).querySelector('.figure .num')?.textContent).toBe('\u200b');
    expect(hasButton(page.fixture, '+ 1')).toBe(false);
    await tap(page, 'Gauge at zero: begin to raise');
    expect(page.commands.at(-1)).toMatchObject({ text: '0.0', timeS: 0 });
    // The walk's clock goes on by a second at each event: the second beginning is five events after the first.
    page.at(5 + 5);
    await tap(page, '+ 1');
    expect(page.commands.at(-1)).toMatchObject({ text: '1.0', timeS: 5 });
    expect(hasButton(page.fixture, 'The noise begins')).toBe(true);
  });

  it('says that it is raised too fast, by the step\u2019s own band, and not before', async () => {
    const page = await shown();
    const remark = (): HTMLElement => elementOf(page.fixture).querySelector<HTMLElement>('.remark')!;
    await tap(page, 'Gauge at zero: begin to raise');
    for (const seconds of [4, 8, 12]) {
      page.at(seconds);
      await tap(page, '+ 0.5');
    }
    expect(remark().textContent).toMatch(/^rising 0\.1\d kPa a second/);
    expect(remark().classList).not.toContain('too-fast');
    for (const seconds of [14, 16, 18, 20]) {
      page.at(seconds);
      await tap(page, '+ 1');
    }
    expect(remark().textContent).toMatch(/^raised too fast, rising 0\.\d+ kPa a second/);
    expect(remark().classList).toContain('too-fast');
  });

  describe('while what was tapped is still being written', () => {
    /** Taps a button; what it asks for waits in line and is not done yet. */
    async function tapAhead({ fixture, commands }: Shown, name: string): Promise<void> {
      const before = commands.length;
      buttonNamed(fixture, name).click();
      for (const command of commands.slice(before)) TestBed.inject(RampQueue).add(command);
      await fixture.whenStable();
    }

    it('takes a mark 0.1 s after a point, and points 0.25 s apart, each at its own moment', async () => {
      const page = await shown();
      await tap(page, 'Gauge at zero: begin to raise');
      page.at(4);
      await tapAhead(page, '+ 0.5');
      page.at(4.1);
      await tapAhead(page, 'The noise begins');
      page.at(4.25);
      await tapAhead(page, '+ 0.5');
      page.at(4.5);
      await tapAhead(page, '+ 0.5');
      page.at(4.6);
      await tapAhead(page, 'The noise stopped');
      expect(page.commands.slice(1)).toMatchObject([
        { text: '0.5', timeS: 4 },
        { mark: 'noise-begins', timeS: 4.1 },
        { text: '1.0', timeS: 4.3 },
        { text: '1.5', timeS: 4.5 },
        { mark: 'noise-stops', timeS: 4.6 },
      ]);
      expect(textOf(page.fixture)).toContain('1.5');
    });

    it('leaves out a bounce on the same control alone', async () => {
      const page = await shown();
      await tap(page, 'Gauge at zero: begin to raise');
      page.at(4);
      await tapAhead(page, '+ 1');
      page.at(4.1);
      await tapAhead(page, '+ 1');
      await tapAhead(page, 'The noise begins');
      page.at(4.3);
      await tapAhead(page, 'The noise stopped');
      expect(page.commands.slice(1)).toMatchObject([{ text: '1.0' }, { mark: 'noise-begins' }]);
      page.at(4.4);
      await tapAhead(page, 'The noise stopped');
      expect(page.commands.at(-1)).toMatchObject({ mark: 'noise-stops', timeS: 4.4 });
    });

    it('takes the last point back though it is not written yet', async () => {
      const page = await shown();
      await tap(page, 'Gauge at zero: begin to raise');
      page.at(4);
      await tapAhead(page, '+ 1');
      page.at(4.3);
      await tapAhead(page, 'Undo last point');
      expect(elementOf(page.fixture).querySelector('.figure .num')?.textContent).toBe('0.0');
    });
  });

  it('takes the exact figure from the pad, timed when it is recorded', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(4);
    const before = page.commands.length;
    for (const name of ['Type it', '2', 'decimal point', '3']) {
      buttonNamed(page.fixture, name).click();
      await page.fixture.whenStable();
    }
    expect(page.commands).toHaveLength(before);
    page.at(6.5);
    await tap(page, 'Record the point');
    expect(page.commands.slice(before)).toEqual([
      { do: 'record', name: 'gauge', text: '2.3', unit: 'kPa', timeS: 6.5 },
    ]);
    expect(hasButton(page.fixture, 'Record the point')).toBe(false);
    page.at(8);
    await tap(page, '+ 0.5');
    expect(page.commands.at(-1)).toMatchObject({ text: '2.8' });
  });

  it('marks from beside the pad, and keeps what is typed there', async () => {
    const page = await shown();
    await tap(page, 'Gauge at zero: begin to raise');
    page.at(4);
    for (const name of ['Type it', '2']) {
      buttonNamed(page.fixture, name).click();
      await page.fixture.whenStable();
    }
    await tap(page, 'The noise begins');
    expect(page.walk.state.series['ramp']?.marks['noise-begins']?.timeS).toBe(4);
    expect(elementOf(page.fixture).querySelector('.figure .num')?.textContent).toBe('2');
  });
});
