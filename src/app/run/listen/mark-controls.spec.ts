import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { RunCommand, Series } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import type { PlotMark } from '../../shared/ramp-plot-options';
import { rampTo, stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, textOf } from '../testing/shown-page';
import type { ListenDone } from './listen-requests';
import { MarkControls } from './mark-controls';

/** A ramp to 8 kPa, a sample a second, whose level is up from 10 s until 25 s where `isHeard`. */
function log(isHeard: boolean): Series {
  const { timeS, channels } = rampTo(8);
  const sound = timeS.map((s) => (isHeard && s >= 10 && s < 25 ? 62 : 50) + 0.3 * Math.sin(s));
  return { timeS, channels: [...channels, { name: 'sound', unit: 'dB', values: sound }] };
}

interface Shown {
  readonly walk: RunWalk;
  readonly fixture: ComponentFixture<MarkControls>;
  readonly commands: RunCommand[];
  readonly done: ListenDone[];
  readonly drawn: (readonly PlotMark[] | undefined)[];
  tap(name: string): Promise<void>;
}

async function shown(series: Series): Promise<Shown> {
  const record = {
    bytes: 1,
    samples: series.timeS.length,
    durationS: series.timeS.at(-1) ?? 0,
    sha256: '0'.repeat(64),
    channels: series.channels.map(({ name, unit }) => ({ name, unit, column: name })),
    source: 'file',
    skipped: 0,
    problems: [],
  } as const;
  const walk = walkedTo('raise-and-listen').do({ do: 'import-series', series, record });
  const fixture = TestBed.createComponent(MarkControls);
  const commands: RunCommand[] = [];
  const done: ListenDone[] = [];
  const drawn: (readonly PlotMark[] | undefined)[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentInstance.finished.subscribe((request) => done.push(request));
  fixture.componentInstance.movedMarks.subscribe((marks) => drawn.push(marks));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, 'listen'));
  fixture.componentRef.setInput('series', series);
  await fixture.whenStable();
  const tap = async (name: string): Promise<void> => {
    buttonNamed(fixture, name).click();
    await fixture.whenStable();
  };
  return { walk, fixture, commands, done, drawn, tap };
}

const figure = ({ fixture }: Shown): string => elementOf(fixture).querySelector('.figure .num')?.textContent ?? '';

describe('MarkControls', () => {
  it('offers both marks from the level, draws both, and keeps both as events', async () => {
    const page = await shown(log(true));
    expect(page.drawn.at(-1)).toMatchObject([
      { label: 'noise begins', timeS: 10, isMain: false },
      { timeS: 24, isMain: true },
    ]);
    await page.tap('Keep the mark and go on');
    expect(page.done.at(-1)?.marks).toEqual([
      { mark: 'noise-begins', timeS: 10, by: 'suggested' },
      { mark: 'noise-stops', timeS: 24, by: 'suggested' },
    ]);
    const { series, marks } = page.done[0]!;
    page.walk.do(...marks.map((mark) => ({ do: 'mark' as const, ...mark })), { do: 'finish-listening', series });
    expect(page.walk.events.filter(({ type }) => type === 'mark-placed')).toHaveLength(2);
  });

  it('moves the mark that is chosen, and lets none pass the other', async () => {
    const page = await shown(log(true));
    await page.tap('Noise begins 10.0 s');
    await page.tap('Later');
    expect(page.drawn.at(-1)).toMatchObject([{ timeS: 10.25 }, { timeS: 24 }]);
    for (let times = 0; times < 4; times += 1) await page.tap('5 s later');
    expect(page.drawn.at(-1)).toMatchObject([{ timeS: 23.95 }, { timeS: 24 }]);
    await page.tap('Noise stops 24.0 s');
    await page.tap('5 s earlier');
    expect(page.drawn.at(-1)).toMatchObject([{ timeS: 23.95 }, { timeS: 24 }]);
    await page.tap('Keep the mark and go on');
    expect(page.done.at(-1)?.marks).toMatchObject([{ mark: 'noise-begins', by: 'tap' }, { by: 'suggested' }]);
  });

  it('goes on without the begin where it was taken away', async () => {
    const page = await shown(log(true));
    await page.tap('Noise begins 10.0 s');
    await page.tap('Take the mark away');
    expect(page.drawn.at(-1)).toMatchObject([{ isMain: true }]);
    await page.tap('Keep the mark and go on');
    expect(page.done.at(-1)?.marks).toMatchObject([{ mark: 'noise-stops' }]);
  });

  it('shows the seal point largest, and the gauge at the mark below it', async () => {
    const page = await shown(log(true));
    const said = /Gauge at the mark (\d\.\d) kPa at 24\.0 s, offered/.exec(textOf(page.fixture));
    expect(Number(said?.[1])).toBeCloseTo(3.8, 1);
    expect(elementOf(page.fixture).querySelector('.name')?.textContent).toBe('Seal point');
    expect(page.drawn.at(-1)?.at(-1)?.label).toBe(`noise stops: ${figure(page)} kPa`);
  });

  it('offers none in silence, and then takes that there was no noise', async () => {
    const page = await shown(log(false));
    expect(page.drawn.at(-1)).toEqual([]);
    await page.tap('No noise at all');
    await page.tap('Sure? No noise at all');
    expect(page.done.at(-1)?.marks).toEqual([]);
  });
});
