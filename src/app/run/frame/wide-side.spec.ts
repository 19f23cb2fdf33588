import { TestBed } from '@angular/core/testing';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { viewOf } from '../testing/run-for-specs';
import { elementOf } from '../testing/shown-page';
import { RunHeaderBar } from './run-header';
import { WideSide } from './wide-side';

describe('WideSide', () => {
  it('folds the author’s notes below the action, and gives both of its sentences', async () => {
    const walk = roundTo('plug');
    const fixture = TestBed.createComponent(WideSide);
    fixture.componentRef.setInput('run', viewOf(walk));
    fixture.componentRef.setInput('step', walk.procedure.step('plug'));
    await fixture.whenStable();
    const notes = elementOf(fixture).querySelector('details');
    expect(notes?.open).toBe(false);
    expect(notes?.querySelector('summary')?.textContent).toContain('2 notes from the author');
    const sentences = [...elementOf(fixture).querySelectorAll('h1 span')].map(({ className, textContent }) => [
      className,
      textContent,
    ]);
    expect(sentences).toEqual([
      ['full', 'Fit the plug into the inlet duct.'],
      ['short', 'Plug in.'],
    ]);
    fixture.componentRef.setInput('isUnderWay', true);
    await fixture.whenStable();
    expect(elementOf(fixture).querySelector('details')).toBeNull();
  });
});

describe('the run’s header', () => {
  it('says nothing of what is sent while the person has to stay at the car', async () => {
    const shownAt = async (stepId: string): Promise<string> => {
      const fixture = TestBed.createComponent(RunHeaderBar);
      fixture.componentRef.setInput('run', viewOf(roundTo(stepId)));
      fixture.componentRef.setInput('connection', 'Offline, 12 kept');
      await fixture.whenStable();
      return elementOf(fixture).querySelector('.chips')?.textContent ?? '';
    };
    expect(await shownAt('coolant')).toContain('Offline, 12 kept');
    const staying = await shownAt('plug');
    expect(staying).toContain('Stay here');
    expect(staying).not.toContain('12 kept');
  });
});
