import 'fake-indexeddb/auto';
import type { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';
import { asked, coreForSpecs, eventually, okafor, registeredTablet } from '../core/testing/core-for-specs';
import type { RunRow } from '../core/stored-rows';
import type { Role } from '../core/wire';
import { TabletPage } from './tablet-page';

async function page(role: Role, prepare: (store: OfflineStore) => Promise<unknown> = () => Promise.resolve()) {
  const { server } = coreForSpecs([provideRouter([])]);
  await prepare(TestBed.inject(OfflineStore));
  const outcome = TestBed.inject(Session).signIn('x', 'y');
  const answer = { accessToken: 'a', expiresInS: 600, person: { ...okafor, role } };
  (await asked(server, 'POST', '/api/session')).flush(answer);
  await outcome;
  const fixture = TestBed.createComponent(TabletPage);
  const root = fixture.nativeElement as HTMLElement;
  await fixture.whenStable();
  const button = (words: string) =>
    [...root.querySelectorAll('button')].find((one) => one.textContent?.trim() === words);
  return { fixture, root, server, button, text: () => root.textContent?.replace(/\s+/g, ' ') ?? '' };
}

async function register(server: HttpTestingController, root: HTMLElement, label: string) {
  const input = root.querySelector<HTMLInputElement>('#label')!;
  input.value = label;
  input.dispatchEvent(new Event('input'));
  root.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
  return asked(server, 'POST', '/api/tablets');
}

describe('TabletPage', () => {
  it('tells a technician who can register the tablet, and offers no form', async () => {
    const { root, text } = await page('technician');
    await eventually(() =>
      expect(text()).toContain('A lead or a manager signs in on this tablet once and registers it.'),
    );
    expect(root.querySelector('#label')).toBeNull();
  });

  it('lets a manager register it under a name', async () => {
    const { root, server, text } = await page('manager');
    (await register(server, root, 'Tablet B2')).flush({ id: 't-1', label: 'Tablet B2' });
    await eventually(() => expect(text()).toContain('It is registered'));
    expect(text()).toContain('Tablet B2');
  });

  it('says beside the name why it could not be registered', async () => {
    const { root, server } = await page('lead');
    (await register(server, root, 'Tablet B2')).error(new ProgressEvent('error'));
    await eventually(() =>
      expect(root.querySelector('#label-error')?.textContent).toBe(
        'The server cannot be reached. Registering needs the network.',
      ),
    );
  });

  it('shows what the server refused with the reason, and offers it again', async () => {
    const refused = { kind: 'events' as const, fromSeq: 1, toSeq: 2, since: 1, refused: 'the chain is broken' };
    const { button, text } = await page('technician', async (store) => {
      await registeredTablet();
      const summary = { procedureTitle: 'Crankcase valve seal', repairOrder: '4417' };
      await store.runs.put({ runId: 'r-1', summary } as unknown as RunRow);
      await store.outbox.add({ ...refused, runId: 'r-1' });
    });
    await eventually(() => expect(text()).toContain('Crankcase valve seal, RO 4417'));
    expect(text()).toContain('the chain is broken');
    expect(button('Save as a file')).toBeDefined();
    button('Offer again')!.click();
    await eventually(() => expect(text()).not.toContain('the chain is broken'));
    const [row] = await TestBed.inject(OfflineStore).outbox.toArray();
    expect(row!.refused).toBeUndefined();
  });

  it('keeps the hand and the measured size of the screen', async () => {
    const { fixture, button } = await page('technician');
    button('Left')!.click();
    button('Wider')!.click();
    await fixture.whenStable();
    button('Keep this size')!.click();
    await eventually(async () =>
      expect(await TestBed.inject(OfflineStore).settings.toArray()).toEqual(
        expect.arrayContaining([
          { key: 'hand', value: 'left' },
          { key: 'px-per-mm', value: 6.35 },
        ]),
      ),
    );
  });
});
