import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { Series } from '../../../../procedures/engine';
import type { RunProblem } from '../run-view';
import { stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { ListenEntry } from './listen-entry';
import type { SeriesTaken } from './listen-requests';

const refusal: RunProblem = {
  code: 'not-at-zero',
  message: 'The gauge begins at 2.4 kPa, not at zero. Let it fall to zero and take that log.',
  field: 'file',
};
const log = (from: number): string =>
  `time_s,gauge_kpa\n${[0, 1, 2, 3].map((s) => `${s},${(from + s / 10).toFixed(1)}`).join('\n')}\n`;
const fileOf = (name: string, text: string): File =>
  Object.assign(new File([text], name), { arrayBuffer: async () => new TextEncoder().encode(text).buffer });

interface Shown {
  readonly fixture: ComponentFixture<ListenEntry>;
  readonly taken: readonly SeriesTaken[];
  /** Chooses a file, as the tablet's own file sheet would. */
  choose(file: File): Promise<void>;
  /** What the run refuses, or nothing. */
  refuse(problem: RunProblem | undefined): Promise<void>;
}

/** The listen step with its page of files open. */
async function shown(): Promise<Shown> {
  const walk = walkedTo('raise-and-listen');
  const fixture = TestBed.createComponent(ListenEntry);
  const taken: SeriesTaken[] = [];
  fixture.componentInstance.seriesTaken.subscribe((series) => taken.push(series));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, 'listen'));
  fixture.componentRef.setInput('elapsed', () => 0);
  await fixture.whenStable();
  buttonNamed(fixture, 'Take a log of the scan tool instead').click();
  await fixture.whenStable();
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  return {
    fixture,
    taken,
    choose: async (file) => {
      const input = elementOf(fixture).querySelector<HTMLInputElement>('input[type=file]')!;
      Object.defineProperty(input, 'files', { value: [file], configurable: true });
      input.dispatchEvent(new Event('change'));
      await settle();
    },
    refuse: async (problem) => {
      fixture.componentRef.setInput('problem', problem);
      await fixture.whenStable();
    },
  };
}

const gaugeOf = ({ channels }: Series) => channels.find(({ name }) => name === 'gauge')?.values;

describe('taking a log in the listen step', () => {
  it('no longer says why the last file was refused once another one is chosen', async () => {
    const { fixture, taken, choose, refuse } = await shown();
    await choose(fileOf('raised.csv', log(2.4)));
    buttonNamed(fixture, 'Take this series').click();
    await refuse(refusal);
    expect(textOf(fixture)).toContain('begins at 2.4 kPa');
    await choose(fileOf('rest.csv', log(0)));
    expect(textOf(fixture)).toContain('rest.csv');
    expect(textOf(fixture)).not.toContain('begins at 2.4 kPa');
    buttonNamed(fixture, 'Take this series').click();
    expect(taken.map(({ series }) => gaugeOf(series)?.[0])).toEqual([2.4, 0]);
  });

  it('says it again when the next file is refused too', async () => {
    const { fixture, choose, refuse } = await shown();
    await choose(fileOf('raised.csv', log(2.4)));
    await refuse(refusal);
    await choose(fileOf('raised-again.csv', log(3.1)));
    await refuse({ ...refusal, message: 'The gauge begins at 3.1 kPa, not at zero.' });
    expect(textOf(fixture)).toContain('begins at 3.1 kPa');
  });

  it('leaves the old refusal behind when the next file cannot be read at all', async () => {
    const { fixture, choose, refuse } = await shown();
    await choose(fileOf('raised.csv', log(2.4)));
    await refuse(refusal);
    await choose(fileOf('empty.csv', ''));
    expect(textOf(fixture)).toContain('empty.csv is empty');
    expect(textOf(fixture)).not.toContain('begins at 2.4 kPa');
    expect(hasButton(fixture, 'Take this series')).toBe(false);
  });

  it('does not carry the refusal over to typing', async () => {
    const { fixture, choose, refuse } = await shown();
    await choose(fileOf('raised.csv', log(2.4)));
    await refuse(refusal);
    buttonNamed(fixture, 'Type it instead').click();
    await fixture.whenStable();
    expect(hasButton(fixture, 'Gauge at zero: begin to raise')).toBe(true);
    expect(textOf(fixture)).not.toContain('begins at 2.4 kPa');
  });

  it('keeps the file that was chosen last, though an earlier one is read later', async () => {
    const { fixture, choose } = await shown();
    let arrive: (bytes: ArrayBuffer) => void = () => undefined;
    const slow = Object.assign(new File(['x'], 'slow.csv'), {
      arrayBuffer: () => new Promise<ArrayBuffer>((done) => (arrive = done)),
    });
    await choose(slow);
    expect(textOf(fixture)).toContain('Reading the file');
    await choose(fileOf('rest.csv', log(0)));
    arrive(new TextEncoder().encode(log(2.4)).buffer);
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('rest.csv');
    expect(textOf(fixture)).not.toContain('slow.csv');
  });
});
