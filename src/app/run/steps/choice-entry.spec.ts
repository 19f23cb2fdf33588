import { TestBed } from '@angular/core/testing';
import type { ChoiceOption } from '../../../../procedures/document';
import type { StepOf } from '../step-entry';
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
});
