import 'fake-indexeddb/auto';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { OfflineStore } from '../core/offline-store';
import { SettingsBook } from '../core/settings-book';
import { coreForSpecs, eventually, registeredTablet, workOffline } from '../core/testing/core-for-specs';
import { VisitDesk } from './visit-desk';
import { VisitFormPage } from './visit-form-page';

@Component({ selector: 'bay-blank', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class Blank {}

async function form(id?: string) {
  const fixture = TestBed.createComponent(VisitFormPage);
  if (id !== undefined) fixture.componentRef.setInput('id', id);
  const root = fixture.nativeElement as HTMLElement;
  document.body.append(root);
  await eventually(() => expect(root.querySelector('form, .state h1')).not.toBeNull());
  const type = async (field: string, text: string) => {
    const input = root.querySelector<HTMLInputElement>(`#${field}`)!;
    input.value = text;
    input.dispatchEvent(new Event('input', { bubbles: true }));
    await fixture.whenStable();
  };
  const keep = async () => {
    root.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
    await fixture.whenStable();
  };
  const errors = () =>
    [...root.querySelectorAll('.error')].map((error) => error.textContent?.trim()).filter((text) => text !== '');
  const valueOf = (field: string) => root.querySelector<HTMLInputElement>(`#${field}`)!.value;
  return { fixture, root, type, keep, errors, valueOf };
}

async function signedIn() {
  const { server } = coreForSpecs([provideRouter([{ path: '**', component: Blank }])]);
  await registeredTablet();
  await workOffline(server);
  return TestBed.inject(OfflineStore);
}

/** Waits until the page has gone on to the visit: nothing of it then outlives the spec. */
const atVisit = (): Promise<void> => eventually(() => expect(TestBed.inject(Router).url).toMatch(/^\/visit\//));

async function fill(type: (field: string, text: string) => Promise<void>) {
  const typed: [string, string][] = [
    ['vin', '1zz bt4ck4 lr204817'],
    ['make', 'Merrow'],
    ['model', 'Heron'],
    ['displacement', '1,6'],
    ['repair-order', '4417'],
    ['odometer', '84 210'],
    ['concern', 'Whistle at idle'],
    ['codes', 'p0068'],
  ];
  for (const [field, text] of typed) await type(field, text);
}

describe('VisitFormPage', () => {
  afterEach(() => document.body.replaceChildren());

  it('keeps the visit on the tablet, queues it, and goes to it', async () => {
    const store = await signedIn();
    const { type, keep } = await form();
    await fill(type);
    await keep();
    await atVisit();
    const [visit] = await store.visits.toArray();
    expect(visit).toMatchObject({
      vin: '1ZZBT4CK4LR204817',
      repairOrder: '4417',
      odometer: { text: '84210', unit: 'km' },
      codes: ['P0068'],
      car: { make: 'Merrow', model: 'Heron', displacementL: '1.6' },
      openedBy: 'p-okafor',
      siteId: 's-ossenholt',
    });
    expect(await store.outbox.toArray()).toMatchObject([{ kind: 'document', documentId: visit!.id }]);
    expect(TestBed.inject(Router).url).toBe(`/visit/${visit!.id}`);
  });

  it('says every mistake beside its field, and goes to the first', async () => {
    const store = await signedIn();
    const { root, keep, errors } = await form();
    expect(errors()).toEqual([]);
    await keep();
    await eventually(() =>
      expect(errors()).toEqual([
        'Type the VIN.',
        'Type the make.',
        'Type the model.',
        'Type the number of the repair order.',
        'Type what the odometer shows.',
        "Type the customer's concern in a few words.",
      ]),
    );
    await eventually(() => expect(document.activeElement).toBe(root.querySelector('#vin')));
    expect(await store.visits.count()).toBe(0);
  });

  it('loses nothing of what was typed when the page is loaded again', async () => {
    await signedIn();
    const first = await form();
    await first.type('vin', '1zzbt4ck');
    await first.type('concern', 'Whistle at');
    await first.type('codes', 'P006');
    first.fixture.destroy();
    document.body.replaceChildren();

    const second = await form();
    await second.fixture.whenStable();
    expect(['vin', 'concern', 'codes'].map(second.valueOf)).toEqual(['1ZZ BT4CK', 'Whistle at', 'P006']);
    expect(second.errors()).toEqual([]);
  });

  it('keeps every key as it is typed, without waiting for the next', async () => {
    const store = await signedIn();
    const write = jest.spyOn(TestBed.inject(SettingsBook), 'write');
    const { fixture, type } = await form();
    await fixture.whenStable();
    expect(write).not.toHaveBeenCalled();
    await type('repair-order', '44');
    expect(write).toHaveBeenCalledTimes(1);
    await eventually(async () =>
      expect(await store.settings.get('visit-draft:new:p-okafor')).toMatchObject({ value: { repairOrder: '44' } }),
    );
  });

  it('finds again what the end of the page did not let it write', async () => {
    const store = await signedIn();
    const first = await form();
    await first.fixture.whenStable();
    const write = jest
      .spyOn(TestBed.inject(SettingsBook), 'write')
      .mockImplementation(() => new Promise(() => undefined));
    await first.type('odometer', '61');
    await first.type('odometer', '61240');
    expect(await store.settings.get('visit-draft:new:p-okafor')).toBeUndefined();
    first.fixture.destroy();
    document.body.replaceChildren();
    write.mockRestore();

    // The next page knows nothing of this one.
    const desk = TestBed.runInInjectionContext(() => new VisitDesk());
    expect(await desk.draft(undefined)).toMatchObject({ odometer: '61240' });
    expect(await store.settings.get('visit-draft:new:p-okafor')).toMatchObject({ value: { odometer: '61240' } });
    await eventually(() => expect(localStorage).toHaveLength(0));
  });

  it('forgets what was typed once the visit is kept', async () => {
    const store = await signedIn();
    const { type, keep } = await form();
    await fill(type);
    const drafts = () => store.settings.filter(({ key }) => key.startsWith('visit-draft')).count();
    await eventually(async () => expect(await drafts()).toBe(1));
    await keep();
    await eventually(async () => expect(await drafts()).toBe(0));
    // Nothing of what was typed may be written after that.
    await atVisit();
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(await drafts()).toBe(0);
  });

  it('keeps a VIN whose check digit does not fit only after a second look', async () => {
    const store = await signedIn();
    const { fixture, root, type, keep, errors } = await form();
    await fill(type);
    await type('vin', '1ZZBT4CK7LR204817');
    await keep();
    await eventually(() => expect(errors()).toEqual(['Look again, or keep it as it is.']));
    root.querySelector<HTMLInputElement>('input[type=checkbox]')!.click();
    await fixture.whenStable();
    await keep();
    await eventually(async () =>
      expect(await store.visits.toArray()).toMatchObject([{ vinKept: 'after a second look' }]),
    );
    await atVisit();
  });

  it('takes no code that is none, and keeps it in its field', async () => {
    const store = await signedIn();
    const { root, type, keep, errors, valueOf } = await form();
    await fill(type);
    await type('codes', 'P0068 P9X');
    await keep();
    await eventually(() =>
      expect(errors()).toEqual(['P9X is no trouble code: a letter P, C, B or U and four digits, such as P0068.']),
    );
    await eventually(() => expect(document.activeElement).toBe(root.querySelector('#codes')));
    expect(valueOf('codes')).toBe('P9X');
    expect(await store.visits.count()).toBe(0);
  });

  it('changes a visit in place, under its own id', async () => {
    const store = await signedIn();
    const first = await form();
    await fill(first.type);
    await first.keep();
    await atVisit();
    await TestBed.inject(Router).navigateByUrl('/');
    const [before] = await store.visits.toArray();
    first.fixture.destroy();
    document.body.replaceChildren();

    const second = await form(before!.id);
    await second.type('odometer', '84,300');
    await second.keep();
    await eventually(async () =>
      expect(await store.visits.toArray()).toMatchObject([
        { id: before!.id, openedAt: before!.openedAt, odometer: { text: '84300' } },
      ]),
    );
    expect(await store.outbox.count()).toBe(1);
    await atVisit();
  });

  it('says when a visit is not on this tablet', async () => {
    await signedIn();
    const { root } = await form('nowhere');
    expect(root.textContent).toContain('This visit is not on the tablet');
  });
});
