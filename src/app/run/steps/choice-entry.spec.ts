import { TestBed } from '@angular/core/testing';
import type { ChoiceOption } from '../../../../procedures/document';
import type { RunCommand } from '../../../../procedures/engine';
import type { StepOf } from '../step-entry';
import { draftsForSpecs } from '../testing/drafts-for-specs';
import { valveSeal, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, elementOf } from '../testing/shown-page';
import { ChoiceEntry } from './choice-entry';

const asksFor = ({ ask }: ChoiceOption): boolean => ask !== undefined;
const step = valveSeal.document.steps.find(
  (candidate): candidate is StepOf<'choice'> =>
    candidate.kind === 'choice' && candidate.options.some(asksFor) && !candidate.options.every(asksFor),
);

describe('ChoiceEntry', () => {
  it('brings the field that an option asks for into sight, ready to be written in', async () => {
    const seen: Element[] = [];
    // The specs' document has no layout, and so no scrolling of its own.
    Element.prototype.scrollIntoView = function (this: Element): void {
      seen.push(this);
    };
    TestBed.configureTestingModule({ providers: draftsForSpecs() });
    const fixture = TestBed.createComponent(ChoiceEntry);
    document.body.append(elementOf(fixture));
    fixture.componentRef.setInput('run', viewOf(walkedTo('manifold-pressure')));
    fixture.componentRef.setInput('step', step);
    await fixture.whenStable();
    buttonNamed(fixture, step!.options.find((option) => !asksFor(option))!.label).click();
    await fixture.whenStable();
    expect(seen).toEqual([]);
    buttonNamed(fixture, step!.options.find(asksFor)!.label).click();
    await fixture.whenStable();
    const field = elementOf(fixture).querySelector('textarea');
    expect(document.activeElement).toBe(field);
    expect(seen).toEqual([field?.closest('.field')]);
  });

  it('says in words what has to be chosen or written first, and records when it is there', async () => {
    TestBed.configureTestingModule({ providers: draftsForSpecs() });
    const fixture = TestBed.createComponent(ChoiceEntry);
    const commands: RunCommand[] = [];
    fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
    fixture.componentRef.setInput('run', viewOf(walkedTo('manifold-pressure')));
    fixture.componentRef.setInput('step', step);
    await fixture.whenStable();
    const tapped = async (name: string): Promise<string | undefined> => {
      buttonNamed(fixture, name).click();
      await fixture.whenStable();
      return elementOf(fixture).querySelector('bay-big-action [role=alert]')?.textContent;
    };
    expect(await tapped('Record and go on')).toBe('Choose first what you see.');
    const option = step!.options.find(asksFor)!;
    expect(await tapped(option.label)).toBeUndefined();
    expect(await tapped('Record and go on')).toBe(`Say above first: ${option.ask}`);
    expect(commands).toEqual([]);
    const field = elementOf(fixture).querySelector('textarea')!;
    field.value = 'behind the airbox';
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
    expect(await tapped('Record and go on')).toBeUndefined();
    expect(commands).toEqual([{ do: 'choose', options: [option.name], text: 'behind the airbox' }]);
  });
});
