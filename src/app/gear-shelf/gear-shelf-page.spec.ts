import 'fake-indexeddb/auto';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';
import { closeStores, coreForSpecs, rememberPerson } from '../core/testing/core-for-specs';
import type { GearItem } from '../core/wire';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { GearShelfPage } from './gear-shelf-page';

const gauge: GearItem = {
  id: 'g-12',
  siteId: 's-ossenholt',
  kind: 'pressure-gauge',
  label: 'G-12',
  serial: '20417',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
  dueOn: '2026-12-11',
  lastCheckedOn: '2025-12-11',
  inUse: true,
};
const overdue: GearItem = { ...gauge, id: 'g-3', label: 'G-3', dueOn: '2026-11-03' };
const elsewhere: GearItem = { ...gauge, id: 'q-1', label: 'Q-1', siteId: 's-quay' };

describe('the Gear shelf', () => {
  let fixture: ComponentFixture<GearShelfPage>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;

  async function showWith(...gear: GearItem[]): Promise<void> {
    coreForSpecs([provideRouter([])]);
    const store = TestBed.inject(OfflineStore);
    await store.sites.put({ id: 's-ossenholt', name: 'Ossenholt', elevationM: 640 });
    await store.gear.bulkPut(gear);
    await rememberPerson();
    void TestBed.inject(Session).start();
    await new Promise((resolve) => setTimeout(resolve, 20));
    TestBed.inject(Session).goOnOffline();
    fixture = TestBed.createComponent(GearShelfPage);
    fixture.autoDetectChanges();
    await settle();
  }
  afterEach(async () => {
    await settle();
    fixture.destroy();
    closeStores();
  });

  it('lists the instruments of one’s own site, what is due first on top', async () => {
    await showWith(gauge, overdue, elsewhere);
    const rows = allByRole(root(), 'row').slice(1).map(textOf);
    expect(rows).toHaveLength(2);
    expect(rows[0]).toContain('G-3');
    expect(rows[1]).toContain('G-12');
    expect(rows[1]).toMatch(/0 to 60 kPa gauge.*0\.1 kPa.*± 0\.25 kPa.*in 9 days/);
  });

  it('says plainly what is overdue, and what that means for a run', async () => {
    await showWith(gauge, overdue);
    expect(textOf(byRole(root(), 'status', 'G-3 is overdue'))).toContain('only with a reason');
    expect(textOf(root())).toContain('overdue by 29 days');
  });

  it('is quiet when nothing is overdue', async () => {
    await showWith(gauge);
    expect(allByRole(root(), 'status', 'overdue')).toEqual([]);
  });

  it('says where instruments come from when there is none', async () => {
    await showWith();
    expect(textOf(root())).toContain('No instrument on this tablet');
  });
});
