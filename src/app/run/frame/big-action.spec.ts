import { TestBed } from '@angular/core/testing';
import { buttonNamed, elementOf } from '../testing/shown-page';
import { BigAction } from './big-action';

async function shown(inputs: Readonly<Record<string, unknown>>) {
  const fixture = TestBed.createComponent(BigAction);
  const set = async (changes: Readonly<Record<string, unknown>>): Promise<void> => {
    for (const [name, value] of Object.entries(changes)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
  };
  let done = 0;
  fixture.componentInstance.done.subscribe(() => (done += 1));
  await set({ label: 'Record and go on', ...inputs });
  const said = (role: string): string | undefined => elementOf(fixture).querySelector(`[role=${role}]`)?.textContent;
  const press = async (): Promise<void> => {
    buttonNamed(fixture, 'Record and go on').click();
    await fixture.whenStable();
  };
  return { fixture, set, press, said, done: () => done };
}

describe('BigAction', () => {
  it('says what is missing, answers a press with it, and does nothing before it is there', async () => {
    const page = await shown({ missing: 'Choose first.' });
    expect([page.said('status'), page.said('alert')]).toEqual(['Choose first.', undefined]);
    await page.press();
    expect([page.said('status'), page.said('alert'), page.done()]).toEqual([undefined, 'Choose first.', 0]);
    await page.set({ missing: 'Say which.' });
    expect([page.said('status'), page.said('alert')]).toEqual(['Say which.', undefined]);
    await page.set({ missing: undefined });
    await page.press();
    expect([page.said('status'), page.said('alert'), page.done()]).toEqual([undefined, undefined, 1]);
  });

  it('says over itself why it was refused, before anything else', async () => {
    const page = await shown({ missing: 'Choose first.', refusal: 'Not both.' });
    expect(page.said('alert')).toBe('Not both.');
    expect(elementOf(page.fixture).querySelector('button')?.previousElementSibling?.textContent).toContain('Not both.');
  });
});
