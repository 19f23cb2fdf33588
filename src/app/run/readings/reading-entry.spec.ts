import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import { buttonNamed, elementOf, hasButton } from '../testing/shown-page';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { ReadingEntry } from './reading-entry';

async function shown(stepId: string, kind: 'reading' | 'wait' = 'reading') {
  const walk = walkedTo(stepId);
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(ReadingEntry);
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, kind));
  const commands: RunCommand[] = [];
  const ways: (string | undefined)[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentInstance.wouldGoTo.subscribe((way) => ways.push(way));
  await fixture.whenStable();
  return { walk, fixture, commands, ways };
}

async function type(fixture: ComponentFixture<unknown>, figure: string): Promise<void> {
  for (const key of figure) buttonNamed(fixture, key === '.' ? 'decimal point' : key).click();
  await fixture.whenStable();
}

describe('ReadingEntry', () => {
  it('shows the band before anything is typed', async () => {
    const { fixture } = await shown('manifold-pressure');
    expect(elementOf(fixture).querySelector('bay-band-gauge svg')?.getAttribute('aria-label')).toBe(
      'no reading yet, band from 91.9 to 95.9 kPa',
    );
  });

  it.each([
    ['94.2', 'in band'],
    ['96.1', 'too close to call'],
    ['97.9', 'out of band'],
  ])('judges %p while it is typed: %p', async (figure, words) => {
    const { fixture } = await shown('manifold-pressure');
    await type(fixture, figure);
    expect(elementOf(fixture).querySelector('.judged')?.textContent).toContain(words);
  });

  it('tells the Route where a figure would lead', async () => {
    const { fixture, ways } = await shown('manifold-pressure');
    await type(fixture, '94.2');
    expect(ways.at(-1)).toBe('boost-pressure');
    for (let i = 0; i < 4; i += 1) buttonNamed(fixture, 'Erase').click();
    await type(fixture, '96.1');
    expect(ways.at(-1)).toBe('manifold-pressure');
  });

  it('records the digits as they were typed, the last nought too', async () => {
    const { fixture, commands } = await shown('manifold-pressure');
    await type(fixture, '94.20');
    buttonNamed(fixture, 'Record and go on').click();
    expect(commands).toEqual([{ do: 'record', name: 'manifoldPressure', text: '94.20', unit: 'kPa' }]);
  });

  it('keeps what was typed beside the refusal, and drops the refusal with the next key', async () => {
    const { walk, fixture, commands } = await shown('manifold-pressure');
    await type(fixture, '700');
    buttonNamed(fixture, 'Record and go on').click();
    const refused = walk.ask(commands[0]!);
    if (refused.ok) throw new Error('700 kPa was taken');
    fixture.componentRef.setInput('problem', refused);
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toContain('between 5 and 350 kPa');
    expect(elementOf(fixture).querySelector('.figure .num')?.textContent).toBe('700');
    buttonNamed(fixture, 'Erase').click();
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('[role=alert]')).toBeNull();
  });

  it('has no minus for an absolute pressure, on the pad or on a keyboard', async () => {
    const { fixture } = await shown('manifold-pressure');
    expect(buttonNamed(fixture, 'minus').disabled).toBe(true);
    for (const key of ['-', '9']) window.dispatchEvent(new KeyboardEvent('keydown', { key }));
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('.figure .num')?.textContent).toBe('9');
  });

  it('has a minus for a temperature', async () => {
    const { fixture } = await shown('cold-enough', 'wait');
    expect(buttonNamed(fixture, 'minus').disabled).toBe(false);
  });

  it('takes a hardware keyboard\u2019s digits, and no letter', async () => {
    const { fixture } = await shown('manifold-pressure');
    for (const key of ['9', 'x', '4', ',', 'e', '2']) window.dispatchEvent(new KeyboardEvent('keydown', { key }));
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('.figure .num')?.textContent).toBe('94.2');
  });

  it('asks first how the air of the place is known, then for what that way needs', async () => {
    const { fixture, commands } = await shown('station-pressure');
    const tiles = [...elementOf(fixture).querySelectorAll<HTMLButtonElement>('bay-way-tiles button')];
    expect(tiles.map((tile) => tile.querySelector('b')?.textContent)).toEqual([
      'Altimeter setting of a station nearby',
      'Barometer at the car',
      'Elevation of the site alone',
    ]);
    tiles[0]?.click();
    await fixture.whenStable();
    await type(fixture, '1013.2');
    expect(elementOf(fixture).querySelector('.derived')?.textContent).toContain('Air of the place 93.9 \u00b1 0.3 kPa');
    buttonNamed(fixture, 'Record and go on').click();
    expect(commands).toEqual([
      { do: 'record', name: 'stationPressure', text: '1013.2', unit: 'hPa', way: 'altimeter-setting' },
    ]);
  });

  it('leads back to the ways while nothing is typed', async () => {
    const { fixture } = await shown('station-pressure');
    elementOf(fixture).querySelector<HTMLButtonElement>('bay-way-tiles button')?.click();
    await fixture.whenStable();
    buttonNamed(fixture, 'Other way').click();
    await fixture.whenStable();
    expect(elementOf(fixture).querySelectorAll('bay-way-tiles button')).toHaveLength(3);
  });

  it('records a way that needs no entry by its tile alone, with the figure that it gives', async () => {
    const { walk, fixture, commands } = await shown('station-pressure');
    const tiles = elementOf(fixture).querySelectorAll<HTMLButtonElement>('bay-way-tiles button');
    tiles[2]?.click();
    expect(commands).toMatchObject([{ do: 'record', name: 'stationPressure', way: 'elevation', unit: 'kPa' }]);
    walk.do(commands[0]!);
    expect(walk.state.current?.id).toBe('manifold-pressure');
  });

  it('takes one quantity after the other, and says what to do while a wait is not over', async () => {
    const { walk, fixture } = await shown('cold-enough', 'wait');
    expect(elementOf(fixture).querySelector('.name')?.textContent).toBe('Coolant temperature');
    walk.do(
      { do: 'record', name: 'coolantTemperature', text: '14', unit: 'degC' },
      { do: 'record', name: 'ambientTemperature', text: '25', unit: 'degC' },
    );
    fixture.componentRef.setInput('run', viewOf(walk));
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('.remark')?.textContent).toContain('Not yet.');
    expect(elementOf(fixture).querySelector('.notes')?.textContent).toContain('before: 14');
    expect(hasButton(fixture, 'Undo 14')).toBe(true);
  });
});
