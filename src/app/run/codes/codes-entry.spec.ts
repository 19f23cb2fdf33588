import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { CodesEntry } from './codes-entry';

/** At the codes of a visit that lists P0068. */
async function shown() {
  const walk = walkedTo('codes-before');
  TestBed.configureTestingModule({ providers: draftsForSpecs() });
  const fixture = TestBed.createComponent(CodesEntry);
  const commands: RunCommand[] = [];
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, 'codes'));
  await fixture.whenStable();
  return { fixture, commands };
}

async function tap(fixture: ComponentFixture<CodesEntry>, name: string): Promise<void> {
  buttonNamed(fixture, name).click();
  await fixture.whenStable();
}

describe('CodesEntry', () => {
  it('does not go on while a code of the visit is unanswered, and points at it', async () => {
    const { fixture, commands } = await shown();
    expect(hasButton(fixture, 'No code at all, go on')).toBe(false);
    await tap(fixture, 'First say above: is P0068 there?');
    expect(commands).toEqual([]);
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toBe(
      'Say of P0068 whether it is there or not.',
    );
  });

  it('goes on without a code when each known one was looked for and is not there', async () => {
    const { fixture, commands } = await shown();
    await tap(fixture, 'P0068: not there');
    await tap(fixture, 'Ask about P0068 again');
    expect(hasButton(fixture, 'None of them is there: no code, go on')).toBe(false);
    await tap(fixture, 'P0068: not there');
    await tap(fixture, 'None of them is there: no code, go on');
    expect(commands).toEqual([{ do: 'record-codes', codes: [] }]);
  });

  it('goes on with a known code that is there', async () => {
    const { fixture, commands } = await shown();
    elementOf(fixture).querySelector<HTMLButtonElement>('button.known')?.click();
    await fixture.whenStable();
    await tap(fixture, 'Keep P0068');
    await tap(fixture, 'These are all, go on');
    expect(commands).toEqual([{ do: 'record-codes', codes: [{ code: 'P0068', status: 'stored' }] }]);
  });

  it('offers the letters first, then the digits that may follow', async () => {
    const { fixture } = await shown();
    await tap(fixture, 'Enter a code');
    const open = () =>
      [...elementOf(fixture).querySelectorAll<HTMLButtonElement>('bay-code-pad .digits button')]
        .filter(({ disabled }) => !disabled)
        .map(({ textContent }) => textContent?.trim());
    expect(open()).toEqual([]);
    window.dispatchEvent(new KeyboardEvent('keydown', { key: 'C', cancelable: true }));
    await fixture.whenStable();
    expect(open()).toEqual(['1', '2', '3', '0']);
  });

  it('says of a maker\u2019s own code what the visit says of it', async () => {
    const { fixture } = await shown();
    await tap(fixture, 'Enter a code');
    for (const key of 'P1234') window.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
    await fixture.whenStable();
    expect(textOf(fixture)).toContain("the maker's own: see their service information");
  });
});
