import { TestBed } from '@angular/core/testing';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { viewOf } from '../testing/run-for-specs';
import { buttonNamed, textOf } from '../testing/shown-page';
import { TakeAgainSheet } from './take-again-sheet';

describe('TakeAgainSheet', () => {
  it('leads with one tap to the step whose reading no longer holds, or back', async () => {
    const walk = roundTo('decide');
    const refusal = walk.ask({ do: 'confirm' });
    if (refusal.ok) throw new Error('the reading holds still');
    const fixture = TestBed.createComponent(TakeAgainSheet);
    const taken: string[] = [];
    let left = 0;
    fixture.componentInstance.takenAgain.subscribe((step) => taken.push(step));
    fixture.componentInstance.left.subscribe(() => (left += 1));
    const inputs = { run: viewOf(walk), of: refusal.takeAgain, said: refusal.message };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    expect(textOf(fixture)).toContain('Coolant temperature no longer holds. A warm engine cools.');
    buttonNamed(fixture, 'Take step 2 again').click();
    buttonNamed(fixture, 'Back to the step').click();
    expect([taken, left]).toEqual([['coolant'], 1]);
  });
});
