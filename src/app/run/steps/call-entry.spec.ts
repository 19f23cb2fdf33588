import { TestBed } from '@angular/core/testing';
import { stepOf, viewOf } from '../testing/run-for-specs';
import { buttonNamed, textOf } from '../testing/shown-page';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { CallEntry } from './call-entry';

describe('CallEntry', () => {
  it('shows what the called procedure found, what is taken over in its band here, and what follows', async () => {
    const walk = roundTo('plug-test');
    const fixture = TestBed.createComponent(CallEntry);
    const commands: unknown[] = [];
    fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
    fixture.componentRef.setInput('run', viewOf(walk));
    fixture.componentRef.setInput('step', stepOf(walk, 'call'));
    await fixture.whenStable();
    const text = textOf(fixture);
    expect(text).toContain('The plug holds 4.2');
    expect(text).toMatch(/Pressure at the plug 4\.2 ± 0\.\d+ kPa in band/);
    expect(text).toContain('It goes on with step 5, show the plug');
    buttonNamed(fixture, 'Seen, go on').click();
    expect(commands).toEqual([{ do: 'confirm' }]);
  });
});
