import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { HandSetting } from './hand-setting';
import { OfflineStore } from './offline-store';
import { Session } from './session';
import { browserStorage, StorageRoom } from './storage-room';
import { asked, closeStores, coreForSpecs, okafor } from './testing/core-for-specs';
import { Theme } from './theme';

/** What was begun to be read ends before the store is closed under it. */
async function closeAfterReading(): Promise<void> {
  TestBed.tick();
  await TestBed.inject(Theme).recalled();
  await TestBed.inject(HandSetting).recalled;
  closeStores();
}
const root = document.documentElement;

describe('Theme', () => {
  afterEach(closeAfterReading);

  it('shows the choice on the page and keeps it with the person', async () => {
    const { server } = coreForSpecs();
    const theme = TestBed.inject(Theme);
    const outcome = TestBed.inject(Session).signIn('okafor', 'right');
    (await asked(server, 'POST', '/api/session')).flush({ accessToken: 'a', expiresInS: 600, person: okafor });
    await outcome;
    TestBed.tick();
    await theme.choose('glare');
    TestBed.tick();
    expect(root.dataset['theme']).toBe('glare');
    expect(await TestBed.inject(OfflineStore).settings.get('theme:p-okafor')).toEqual({
      key: 'theme:p-okafor',
      value: 'glare',
    });
  });

  it('brings back what the person chose last', async () => {
    const { server } = coreForSpecs();
    await TestBed.inject(OfflineStore).settings.put({ key: 'theme:p-okafor', value: 'night' });
    const theme = TestBed.inject(Theme);
    const outcome = TestBed.inject(Session).signIn('okafor', 'right');
    (await asked(server, 'POST', '/api/session')).flush({ accessToken: 'a', expiresInS: 600, person: okafor });
    await outcome;
    TestBed.tick();
    await theme.recalled();
    expect(theme.name()).toBe('night');
  });
});

describe('HandSetting', () => {
  afterEach(closeAfterReading);

  it('carries hand and millimetre to the page, and back again', async () => {
    coreForSpecs();
    const holding = TestBed.inject(HandSetting);
    await holding.chooseHand('left');
    await holding.measure(5.2);
    TestBed.tick();
    expect([root.dataset['hand'], root.style.getPropertyValue('--mm')]).toEqual(['left', '5.2px']);
    await holding.measure(undefined);
    TestBed.tick();
    expect(root.style.getPropertyValue('--mm')).toBe('');
  });

  it.each([0, 2.9, 12.1, Number.NaN])('refuses %d pixels in a millimetre', async (size) => {
    coreForSpecs();
    await expect(TestBed.inject(HandSetting).measure(size)).rejects.toBeInstanceOf(RangeError);
  });
});

describe('StorageRoom', () => {
  afterEach(closeAfterReading);

  const withStorage = (storage: Partial<StorageManager> | undefined) => {
    coreForSpecs([{ provide: browserStorage, useValue: storage }]);
    return TestBed.inject(StorageRoom);
  };

  it('asks the browser to keep what is stored, and counts photos to two digits', async () => {
    const room = withStorage({
      persisted: () => Promise.resolve(false),
      persist: () => Promise.resolve(true),
      estimate: () => Promise.resolve({ quota: 3_000_000_000, usage: 460_000_000 }),
    });
    await room.secure();
    expect(room.isPersistent()).toBe(true);
    expect(room.room()).toEqual({ usedBytes: 460_000_000, freeBytes: 2_540_000_000 });
    expect(room.photosLeft()).toBe(2100);
  });

  it('says nothing where the browser says nothing', async () => {
    const room = withStorage(undefined);
    await room.secure();
    expect([room.room(), room.isPersistent(), room.photosLeft()]).toEqual([undefined, undefined, undefined]);
  });
});
