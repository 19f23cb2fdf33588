import 'fake-indexeddb/auto';
import type { HttpTestingController } from '@angular/common/http/testing';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { contentHash } from '../../../procedures/engine';
import { crankcaseValveSeal } from '../../../procedures/library';
import { OfflineStore } from '../core/offline-store';
import { asked, closeStores, coreForSpecs, startOfDay } from '../core/testing/core-for-specs';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { fileText } from './export-version';
import { MethodDeskPage } from './method-desk-page';

const id = 'crankcase-valve-seal';
const hash = 'ab12cd34ef'.repeat(6) + 'ab12';
const version = (number: number, status: 'published' | 'withdrawn') => ({
  version: number,
  status,
  publishedAt: new Date(startOfDay - 86_400_000).toISOString(),
  publishedBy: 'R. Adeyemi',
  contentHash: hash,
});
const draft = {
  id: 'draft-1',
  contentHash: 'ff'.repeat(32),
  title: 'Crankcase valve seal, better',
  importedAt: new Date(startOfDay).toISOString(),
  importedBy: 'R. Adeyemi',
  problems: [],
};
const listed = {
  id,
  title: 'Crankcase valve seal',
  versions: [version(4, 'published'), version(3, 'withdrawn')],
  draft,
};

describe('the Method desk', () => {
  let server: HttpTestingController;
  let fixture: ComponentFixture<MethodDeskPage>;

  beforeEach(() => {
    server = coreForSpecs([provideRouter([])]).server;
    fixture = TestBed.createComponent(MethodDeskPage);
    document.body.append(fixture.nativeElement as HTMLElement);
    fixture.autoDetectChanges();
  });
  afterEach(async () => {
    await settle();
    fixture.destroy();
    closeStores();
    document.body.replaceChildren();
  });

  const root = (): HTMLElement => document.body;
  async function answer(method: string, url: string, body: object, status = 200): Promise<unknown> {
    const request = await asked(server, method, url);
    request.flush(body, { status, statusText: String(status) });
    await settle();
    return request.request.body;
  }
  const showList = (list: object = [listed]): Promise<unknown> => answer('GET', '/api/procedures', list);
  async function choose(text: string, name = 'seal.json'): Promise<void> {
    const field = root().querySelector<HTMLInputElement>('input[type="file"]')!;
    const file = { name, text: () => Promise.resolve(text) };
    Object.defineProperty(field, 'files', { value: [file], configurable: true });
    field.dispatchEvent(new Event('change'));
    await settle();
  }
  const alerts = (): string => allByRole(root(), 'alert').map(textOf).join(' ');

  it('lists each version with its state, when and by whom, and the beginning of its hash', async () => {
    await showList();
    const rows = allByRole(root(), 'row').slice(1).map(textOf);
    expect(rows[0]).toMatch(/^5\s*draft/);
    expect(rows[1]).toMatch(/^4\s*published.*new runs take this one.*R\. Adeyemi.*ab12cd34ef/);
    expect(rows[1]).not.toContain(hash);
    expect(rows[2]).toMatch(/^3\s*withdrawn/);
    expect(allByRole(root(), 'button', 'Withdraw')).toHaveLength(1);
  });

  it('gives the reason for which a version was withdrawn, by whom and when', async () => {
    const at = new Date(startOfDay).toISOString();
    const withdrawal = { reason: 'The band was too wide.', by: 'R. Adeyemi', at };
    await showList([{ ...listed, versions: [version(4, 'published'), { ...version(3, 'withdrawn'), withdrawal }] }]);
    const rows = allByRole(root(), 'row').slice(1).map(textOf);
    expect(rows[2]).toMatch(/^3\s*withdrawn\s*The band was too wide\..*withdrawn today \d+:\d+, R\. Adeyemi/);
    expect(rows[1]).not.toContain('too wide');
  });

  it.each([
    [{ ...listed }, undefined],
    [{ ...listed, versions: [version(3, 'withdrawn')] }, 'only a draft'],
    [{ ...listed, versions: [version(3, 'withdrawn')], draft: null }, 'withdrawn: no new run starts'],
  ])("marks a title that is not a published version's", async (procedure, mark) => {
    await showList([procedure]);
    expect(root().querySelector('bay-procedure-versions header .chip')?.textContent?.trim()).toBe(mark);
  });

  it.each<[string, object, string]>([
    [
      'version',
      { versions: [{ ...version(4, 'published'), contentHash: contentHash(crankcaseValveSeal) }] },
      'Version 4',
    ],
    ['draft', { draft: { ...draft, contentHash: contentHash(crankcaseValveSeal) } }, 'The draft that waits'],
  ])('says that nothing changed for a file that is the standing %s, and sends nothing', async (_what, change, what) => {
    await showList([{ ...listed, ...change }]);
    await choose(fileText(crankcaseValveSeal));
    expect(allByRole(root(), 'dialog')).toEqual([]);
    server.expectNone('/api/procedures/drafts');
    const says = `${what} says exactly what seal.json says: nothing was changed.`;
    expect(textOf(byRole(root(), 'status', says))).toBe(says);
  });

  it('takes a file that is a withdrawn version', async () => {
    const versions = [{ ...version(4, 'withdrawn'), contentHash: contentHash(crankcaseValveSeal) }];
    await showList([{ ...listed, versions, draft: null }]);
    await choose(fileText(crankcaseValveSeal));
    await answer('POST', '/api/procedures/drafts', { id: 'd', procedureId: id, problems: [] }, 201);
    await showList();
  });

  it('says so when the same was brought in elsewhere meanwhile', async () => {
    await showList([]);
    await choose(fileText(crankcaseValveSeal));
    const detail = 'The draft that waits says exactly the same: nothing was changed.';
    await answer('POST', '/api/procedures/drafts', { title: 'Conflict', detail }, 409);
    await showList();
    expect(textOf(byRole(root(), 'status', detail))).toBe(detail);
    expect(alerts()).toBe('');
  });

  it('brings a file in as a draft', async () => {
    await showList([]);
    expect(textOf(root())).toContain('No procedure yet');
    await choose(fileText(crankcaseValveSeal));
    const sent = await answer('POST', '/api/procedures/drafts', { id: 'd', procedureId: id, problems: [] }, 201);
    expect(sent).toEqual(crankcaseValveSeal);
    await showList();
    expect(textOf(byRole(root(), 'status', 'is a draft now'))).toContain('seal.json');
  });

  it('asks before a file takes the place of the draft that waits', async () => {
    await showList();
    await choose(fileText(crankcaseValveSeal));
    expect(textOf(byRole(root(), 'dialog'))).toMatch(
      /Crankcase valve seal, better.*brought in by R\. Adeyemi, today .*seal\.json takes its place/,
    );
    server.expectNone('/api/procedures/drafts');
    byRole(root(), 'button', 'Replace it').click();
    await settle();
    const sent = await answer('POST', '/api/procedures/drafts', { id: 'd', procedureId: id, problems: [] }, 201);
    expect(sent).toEqual(crankcaseValveSeal);
    await showList();
    expect(textOf(byRole(root(), 'status', 'is a draft now'))).toContain('seal.json');
  });

  it('leaves the draft that waits when it is not to be replaced, and says so', async () => {
    await showList();
    await choose(fileText(crankcaseValveSeal));
    byRole(root(), 'button', 'Leave the earlier draft').click();
    await settle();
    server.expectNone('/api/procedures/drafts');
    expect(textOf(byRole(root(), 'status', 'was not brought in'))).toContain('The earlier draft stays as it is.');
  });

  it('asks nothing where another procedure has a draft', async () => {
    await showList([{ ...listed, id: 'another' }]);
    await choose(fileText(crankcaseValveSeal));
    expect(allByRole(root(), 'dialog')).toEqual([]);
    await answer('POST', '/api/procedures/drafts', { id: 'd', procedureId: id, problems: [] }, 201);
    await showList();
  });

  it('lists what is to be mended by step and place, and keeps the file', async () => {
    await showList();
    await choose(
      '{"format":1,"steps":[{"id":"heard","number":"11b","title":"What was heard"},{"id":"look","number":"17b","kind":"stare"}]}',
    );
    await answer(
      'POST',
      '/api/procedures/drafts',
      {
        title: 'Invalid',
        errors: [
          {
            pointer: '/steps/0/next/1/when',
            detail: 'Step heard: branch 2: sealPiont is not a name: mend it',
          },
          { pointer: '/steps/1/kind', detail: 'Step 17b: no such kind of step' },
          { pointer: '/title', detail: 'must be there' },
        ],
      },
      422,
    );
    expect(alerts()).toContain('3 problems must be mended');
    expect(alerts()).toMatch(/Step 11b, What was heard\s*branch 2\s*sealPiont is not a name: mend it/);
    expect(alerts()).toMatch(/Step 17b\s*no such kind of step/);
    expect(alerts()).toMatch(/The document\s*must be there/);
  });

  it('still has the file after a reload', async () => {
    await showList();
    await choose('{ "format": 1,');
    fixture.destroy();
    fixture = TestBed.createComponent(MethodDeskPage);
    document.body.append(fixture.nativeElement as HTMLElement);
    fixture.autoDetectChanges();
    await showList();
    expect(alerts()).toContain('seal.json');
    byRole(root(), 'button', 'Put the file away').click();
    await settle();
    expect(alerts()).toBe('');
  });

  it('keeps a file that could not be checked for want of a network, and checks it again as it is', async () => {
    await showList();
    await choose('{"format":1}');
    await answer('POST', '/api/procedures/drafts', {}, 503);
    expect(alerts()).toContain('waits for the network');
    byRole(root(), 'button', 'Check it again').click();
    await answer('POST', '/api/procedures/drafts', { id: 'd', procedureId: id, problems: [] }, 201);
    await showList();
    expect(alerts()).toBe('');
  });

  it('publishes a draft only after it was confirmed', async () => {
    await showList();
    byRole(root(), 'button', 'Publish').click();
    await settle();
    expect(textOf(byRole(root(), 'dialog'))).toContain('It can never be changed again');
    byRole(root(), 'button', 'Publish version 5').click();
    await settle();
    await answer('POST', '/api/procedures/drafts/draft-1/publication', { id, version: 5 }, 201);
    await showList();
    expect(textOf(byRole(root(), 'status', 'published as version 5'))).toContain('Crankcase valve seal, better');
  });

  it('publishes nothing when it is not confirmed', async () => {
    await showList();
    byRole(root(), 'button', 'Publish').click();
    await settle();
    byRole(root(), 'button', 'Not yet').click();
    await settle();
    server.expectNone('/api/procedures/drafts/draft-1/publication');
    expect(allByRole(root(), 'dialog')).toEqual([]);
  });

  it('says why when the server does not publish, and changes nothing', async () => {
    await showList();
    byRole(root(), 'button', 'Publish').click();
    await settle();
    byRole(root(), 'button', 'Publish version 5').click();
    await settle();
    const detail = 'Version 4 says exactly the same.';
    await answer('POST', '/api/procedures/drafts/draft-1/publication', { title: 'Conflict', detail }, 409);
    expect(textOf(byRole(root(), 'status', detail))).toBe(detail);
  });

  it('withdraws a version with a reason, and not without one', async () => {
    await showList();
    byRole(root(), 'button', 'Withdraw').click();
    await settle();
    byRole(root(), 'button', 'Withdraw version 4').click();
    await settle();
    expect(textOf(byRole(root(), 'dialog'))).toContain('Say why in a few words');
    const reason = byRole(root(), 'textbox', 'Why it is withdrawn') as HTMLTextAreaElement;
    reason.value = 'the band was too wide';
    reason.dispatchEvent(new Event('input'));
    byRole(root(), 'button', 'Withdraw version 4').click();
    await settle();
    const sent = await answer('POST', `/api/procedures/${id}/versions/4/withdrawal`, {}, 201);
    expect(sent).toEqual({ reason: 'the band was too wide' });
  });

  it('exports a version as the file that it was published from', async () => {
    await TestBed.inject(OfflineStore).procedures.put({
      id,
      ...version(4, 'published'),
      document: crankcaseValveSeal,
    });
    let exported: Blob | undefined;
    URL.createObjectURL = jest.fn((blob: Blob) => {
      exported = blob;
      return 'blob:exported';
    });
    URL.revokeObjectURL = jest.fn();
    const click = jest.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(() => undefined);
    await showList();
    allByRole(root(), 'button', 'Export')[0]!.click();
    await settle();
    expect(click.mock.contexts[0]).toMatchObject({ download: 'crankcase-valve-seal-version-4.json' });
    expect(exported?.size).toBe(new TextEncoder().encode(fileText(crankcaseValveSeal)).length);
    click.mockRestore();
  });

  it('says so when a version is not on this device', async () => {
    await showList();
    allByRole(root(), 'button', 'Export')[1]!.click();
    await settle();
    expect(textOf(byRole(root(), 'status', 'Version 3'))).toContain('not on this device yet');
  });

  it('needs the network for the list, and says so', async () => {
    await answer('GET', '/api/procedures', {}, 504);
    expect(alerts()).toContain('No network');
  });
});
