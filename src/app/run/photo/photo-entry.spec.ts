import { TestBed } from '@angular/core/testing';
import type { RunCommand } from '../../../../procedures/engine';
import { roundTo } from '../../../../procedures/engine/testing/walk-round-walk';
import { stepOf, viewOf } from '../testing/run-for-specs';
import { buttonNamed, elementOf, hasButton, textOf } from '../testing/shown-page';
import { PhotoEntry } from './photo-entry';
import type { PhotoTaken } from './photo-file';

const jpeg = new Uint8Array([0xff, 0xd8, 0xff, 0xe0, 0, 16]);

async function shown() {
  URL.createObjectURL = () => 'blob:taken';
  URL.revokeObjectURL = () => undefined;
  const walk = roundTo('photo');
  const fixture = TestBed.createComponent(PhotoEntry);
  const taken: PhotoTaken[] = [];
  const commands: RunCommand[] = [];
  fixture.componentInstance.photoTaken.subscribe((photo) => taken.push(photo));
  fixture.componentInstance.commanded.subscribe((command) => commands.push(command));
  fixture.componentRef.setInput('run', viewOf(walk));
  fixture.componentRef.setInput('step', stepOf(walk, 'photo'));
  await fixture.whenStable();
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  const press = async (name: string): Promise<void> => {
    buttonNamed(fixture, name).click();
    await settle();
  };
  return {
    walk,
    fixture,
    taken,
    commands,
    press,
    /** Gives a file, as the tablet's own camera would. */
    photograph: async (bytes: Uint8Array) => {
      const input = elementOf(fixture).querySelector<HTMLInputElement>('input[type=file]')!;
      const file = { size: bytes.length, arrayBuffer: () => Promise.resolve(bytes.slice().buffer) };
      Object.defineProperty(input, 'files', { value: [file], configurable: true });
      input.dispatchEvent(new Event('change'));
      await settle();
    },
    keep: async () => {
      walk.do(taken.at(-1)!.command);
      fixture.componentRef.setInput('run', viewOf(walk));
      await settle();
    },
  };
}

describe('PhotoEntry', () => {
  it('says what the photo must show, and opens the camera at the back of the tablet', async () => {
    const { fixture, press } = await shown();
    expect(textOf(fixture)).toContain('It must show The whole plug, in focus. The gauge beside it');
    const input = elementOf(fixture).querySelector<HTMLInputElement>('input[type=file]')!;
    expect([input.accept, input.getAttribute('capture')]).toEqual(['image/*', 'environment']);
    let opened = 0;
    input.click = () => (opened += 1);
    await press('Take the photo');
    expect(opened).toBe(1);
  });

  it('shows the photo before it is kept, and keeps nothing that is taken again', async () => {
    const { fixture, taken, press, photograph } = await shown();
    await photograph(jpeg);
    expect(elementOf(fixture).querySelector('img')?.getAttribute('src')).toBe('blob:taken');
    expect(textOf(fixture)).toContain('No photo kept yet');
    expect(taken).toEqual([]);
    await photograph(new Uint8Array([...jpeg, 7]));
    await press('Keep this photo');
    expect(taken.map(({ blob }) => blob.bytes.length)).toEqual([7]);
  });

  it('goes on once one is kept, or takes one more', async () => {
    const { fixture, commands, press, photograph, keep } = await shown();
    expect(hasButton(fixture, 'Photo kept, go on')).toBe(false);
    await photograph(jpeg);
    await press('Keep this photo');
    await keep();
    expect(textOf(fixture)).toContain('1 photo kept');
    await photograph(new Uint8Array([...jpeg, 9]));
    await press('Keep this photo');
    await keep();
    expect(textOf(fixture)).toContain('2 photos kept');
    await press('Photo kept, go on');
    expect(commands).toEqual([{ do: 'confirm' }]);
  });

  it('says over the action why a file is no photo, and forgets that with the next one', async () => {
    const { fixture, photograph } = await shown();
    await photograph(new Uint8Array([1, 2, 3]));
    expect(elementOf(fixture).querySelector('[role=alert]')?.textContent).toContain('This file is no photo');
    expect(hasButton(fixture, 'Keep this photo')).toBe(false);
    await photograph(jpeg);
    expect(elementOf(fixture).querySelector('[role=alert]')).toBeNull();
  });
});
