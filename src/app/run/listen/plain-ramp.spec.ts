import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { rampTo, stepOf, viewOf } from '../testing/run-for-specs';
import { buttonNamed, hasButton, textOf } from '../testing/shown-page';
import { ListenEntry } from './listen-entry';
import type { ListenDone } from './listen-requests';

// The plot draws on a canvas, which jsdom has not.
jest.mock('uplot', () => ({ __esModule: true, default: jest.fn(() => ({ destroy: jest.fn() })) }));

async function shown(walk: RunWalk, inputs: Readonly<Record<string, unknown>> = {}) {
  const fixture = TestBed.createComponent(ListenEntry);
  const done: ListenDone[] = [];
  const commands: RunCommand[] = [];
  fixture.componentInstance.finished.subscribe((request) => done.push(request));
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  const all = { run: viewOf(walk), step: stepOf(walk, 'ramp'), elapsed: () => 0, ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return { fixture, done, commands };
}

const point = (text: string, timeS: number): RunCommand => ({ do: 'record', name: 'gauge', text, unit: 'kPa', timeS });
const noise = ['The noise begins', 'No noise at all', 'It never stopped'];

describe('a ramp without marks', () => {
  it('shows what is found while it is typed, and asks for no mark', async () => {
    const walk = roundTo('raise').do(point('0.0', 0), point('2.0', 5), point('4.0', 10));
    const { fixture, done } = await shown(walk);
    expect(textOf(fixture)).toMatch(/Highest pressure 4\.0 ± 0\.\d kPa in band/);
    expect(noise.filter((name) => hasButton(fixture, name))).toEqual([]);
    buttonNamed(fixture, 'Keep the ramp and go on').click();
    expect(done.map(({ marks, series }) => [marks, series.timeS])).toEqual([[[], [0, 5, 10]]]);
  });

  it('is not kept before it has three points, and says so', async () => {
    const { fixture, done } = await shown(roundTo('raise').do(point('0.0', 0), point('2.0', 5)));
    buttonNamed(fixture, 'Keep the ramp and go on').click();
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('Three points at least make a ramp.');
    expect(done).toEqual([]);
  });

  it('shows what is found in a file, which may be taken anew', async () => {
    const series = rampTo(6);
    const record = {
      sha256: '0'.repeat(64),
      bytes: 1,
      samples: series.timeS.length,
      durationS: 30,
      channels: [{ name: 'gauge', unit: 'kPa', column: 'gauge' }],
      source: 'file',
      skipped: 0,
      problems: [],
    } as const;
    const walk = roundTo('raise').do({ do: 'import-series', series, record });
    const { fixture, done, commands } = await shown(walk, { kept: series });
    expect(textOf(fixture)).toMatch(/Highest pressure 6\.0 .*in band/);
    buttonNamed(fixture, 'Another file').click();
    expect(commands).toEqual([{ do: 'redo', step: 'raise', reason: 'another file is taken' }]);
    buttonNamed(fixture, 'Keep the ramp and go on').click();
    expect(done).toEqual([{ series, marks: [] }]);
  });
});
