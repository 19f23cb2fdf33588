import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import { cautionToRead } from '../step-cautions';
import { stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { buttonNamed, textOf } from '../testing/shown-page';
import { CautionGate } from './caution-gate';

describe('CautionGate', () => {
  it('shows each caution of the step by itself, and lets nothing by before the last tap', async () => {
    const walk = walkedTo('key-on', { cautions: false });
    const step = stepOf(walk, 'action');
    const fixture = TestBed.createComponent(CautionGate);
    const commands: RunCommand[] = [];
    fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
    fixture.componentRef.setInput('step', step);
    const seen: string[] = [];
    for (let tries = 0; tries < 5; tries += 1) {
      const caution = cautionToRead(viewOf(walk), step);
      if (caution === undefined) break;
      expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'caution-first' });
      fixture.componentRef.setInput('run', viewOf(walk));
      fixture.componentRef.setInput('caution', caution);
      await fixture.whenStable();
      seen.push(textOf(fixture));
      buttonNamed(fixture, 'I have read it').click();
      walk.do(commands.at(-1)!);
    }
    expect(seen).toHaveLength(2);
    expect(seen[0]).toContain('1 of 2 WARNING The key wakes motors');
    expect(seen[1]).toContain('2 of 2 NOTICE The diagnostic socket');
    expect(walk.ask({ do: 'confirm' }).ok).toBe(true);
  });
});
