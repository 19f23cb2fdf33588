import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import type { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { listenedTo, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { FindingEntry } from './finding-entry';

/** A cold half that ends as not completed, before anything was opened. */
const ended = (): RunWalk => walkedTo('cold-enough').do({ do: 'cannot-measure', reason: 'the thermometer fails' });

/** Goes on from where the test was ended: what is apart goes back, the rest is confirmed. */
function endStep(walk: RunWalk): void {
  const step = walk.procedure.step(walk.state.current?.id ?? '')!;
  walk.cautions(step.cautions?.length ?? 0);
  if (step.kind === 'wait') walk.do({ do: 'record', name: 'gaugeLeft', text: '0.0', unit: 'kPa' });
  else if (step.kind === 'codes') walk.do({ do: 'record-codes', codes: [] });
  else if (step.kind === 'restore')
    walk.do(...walk.state.disturbed.map(({ item }): RunCommand => ({ do: 'restore', item })));
  else walk.do({ do: 'confirm' });
}

async function shown(walk: RunWalk) {
  const fixture = TestBed.createComponent(FindingEntry);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentInstance.drafted.subscribe((draft) => fixture.componentRef.setInput('draft', draft));
  const show = async (): Promise<void> => {
    fixture.componentRef.setInput('run', viewOf(walk));
    fixture.componentRef.setInput('step', walk.procedure.step(walk.state.finding ?? ''));
    await fixture.whenStable();
  };
  await show();
  const tap = async (name: string): Promise<void> => {
    buttonNamed(fixture, name).click();
    const command = commands.pop();
    if (command !== undefined) walk.do(command);
    await show();
  };
  return { fixture, tap, commands };
}
async function write(fixture: Awaited<ReturnType<typeof shown>>['fixture'], text: string): Promise<void> {
  const field = elementOf(fixture).querySelector('textarea')!;
  field.value = text;
  field.dispatchEvent(new Event('input'));
  await fixture.whenStable();
}
const partNamed = (fixture: Awaited<ReturnType<typeof shown>>['fixture'], name: string): HTMLButtonElement =>
  [...elementOf(fixture).querySelectorAll<HTMLButtonElement>('.parts button')].find(
    (button) => button.querySelector('b')?.textContent === name,
  )!;

describe('FindingEntry', () => {
  it('shows the verdict and the write-up as the record composes it', async () => {
    const { fixture } = await shown(ended());
    expect(elementOf(fixture).querySelector('h1')?.textContent).toContain('Not completed');
    expect(textOf(fixture)).toContain('Write-up composed from the record');
    expect(partNamed(fixture, 'Concern').querySelector('em')).toBeNull();
    expect(partNamed(fixture, 'Concern').textContent).toContain('Whistle at idle');
  });

  it('shows what led to it, and folds the readings that did not', async () => {
    const walk = listenedTo(8, { begins: 0.4 });
    walk.do(
      { do: 'confirm' },
      { do: 'acknowledge-caution', caution: 0 },
      { do: 'cannot-measure', reason: 'it is dark' },
    );
    while (walk.state.finding === undefined) endStep(walk);
    const { fixture } = await shown(walk);
    const wide = elementOf(fixture).querySelector('bay-sheet-wide')!;
    expect(
      [...wide.querySelectorAll('.seen')].map((seen) =>
        [...seen.children].map(({ textContent }) => textContent).join(': '),
      ),
    ).toEqual([
      'Step 13, where the air comes out: cannot be measured: it is dark',
      'Noise at the probe: heard, and it never stopped',
    ]);
    const folded = wide.querySelector('details')!;
    expect(folded.open).toBe(false);
    expect(folded.querySelector('summary')?.textContent).toBe('4 more readings');
    const labels = [...wide.querySelectorAll('bay-judged-line .label')].map((label) => label.textContent);
    expect(labels).toEqual([
      'Highest pressure reached',
      'Fastest rise in a second',
      'Manifold minus boost',
      'Boost pressure',
      'Manifold pressure',
    ]);
  });

  it('tells what was edited from what was composed, and keeps both apart in the record', async () => {
    const walk = ended();
    const { fixture, tap } = await shown(walk);
    partNamed(fixture, 'Correction').click();
    await fixture.whenStable();
    await write(fixture, 'Come back with another thermometer.');
    await tap('Done');
    expect(partNamed(fixture, 'Correction').querySelector('em')?.textContent).toBe('edited');
    await tap('Keep the write-up');
    expect(walk.state.writeUp).toMatchObject({
      correction: 'Come back with another thermometer.',
      edited: ['correction'],
    });
  });

  it('gives back what the record composed', async () => {
    const walk = ended();
    const { fixture, tap } = await shown(walk);
    partNamed(fixture, 'Cause').click();
    await fixture.whenStable();
    await write(fixture, 'Something else.');
    await tap('As the record composed it');
    await tap('Done');
    expect(partNamed(fixture, 'Cause').querySelector('em')).toBeNull();
    expect(partNamed(fixture, 'Cause').textContent).not.toContain('Something else.');
  });

  it('reads back what is open, and closes only from there', async () => {
    const walk = ended();
    const { fixture, tap } = await shown(walk);
    expect(hasButton(fixture, 'Close the run')).toBe(false);
    await tap('Keep the write-up');
    await tap('Kept. To the closing');
    expect(textOf(fixture)).toContain('Read back Still disturbed none Steps not measured 1 Ways overruled none');
    await tap('Close the run');
    expect(walk.state.status).toBe('closed');
    expect(textOf(fixture)).toContain('The run is closed');
  });

  it('keeps the closing shut while something is apart, and gives each its tick', async () => {
    const walk = ended();
    const { fixture, tap, commands } = await shown(walk);
    await tap('Keep the write-up');
    await tap('Kept. To the closing');
    const view = viewOf(walk);
    const item = {
      item: 'dipstick',
      label: 'dipstick',
      restore: 'Put the dipstick back in.',
      step: 'dipstick-out',
      seq: 9,
    };
    fixture.componentRef.setInput('run', { ...view, state: { ...view.state, disturbed: [item] } });
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('Still disturbed 1');
    expect(buttonNamed(fixture, 'Close the run').disabled).toBe(true);
    elementOf(fixture).querySelector<HTMLButtonElement>('bay-restore-list button')?.click();
    expect(commands).toEqual([{ do: 'restore', item: 'dipstick' }]);
  });
});
