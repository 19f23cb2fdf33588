import type { GearNeed } from '../../../../procedures/document';
import type { GearItem } from '../../core/wire';
import { gearFor } from './gear-facts';

const now = Date.UTC(2026, 11, 2, 9);
const need: GearNeed = {
  role: 'gauge',
  kind: 'pressure-gauge',
  label: 'Gauge',
  shows: { unit: 'kPa', low: 0, high: 35, resolution: 0.2 },
};
const gauge = (label: string, resolution: number, dueOn: string, more: Partial<GearItem> = {}): GearItem => ({
  id: label.toLowerCase(),
  siteId: 's-ossenholt',
  kind: 'pressure-gauge',
  label,
  serial: 'x',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution, accuracy: 0.25 }],
  dueOn,
  lastCheckedOn: '2026-01-01',
  inUse: true,
  ...more,
});

describe('gearFor', () => {
  it('puts sound instruments first, then coarse ones, then overdue ones', () => {
    const gear = [gauge('G-3', 0.2, '2026-11-05'), gauge('G-7', 1, '2027-03-01'), gauge('G-12', 0.1, '2026-12-10')];
    expect(gearFor(need, gear, now).map(({ item }) => item.label)).toEqual(['G-12', 'G-7', 'G-3']);
  });

  it('says until when a check holds, and by how much one is overdue', () => {
    const due = (dueOn: string): string | undefined => gearFor(need, [gauge('G', 0.1, dueOn)], now)[0]?.due;
    expect(due('2026-12-10')).toBe('check holds 8 more days');
    expect(due('2026-12-03')).toBe('check holds 1 more day');
    expect(due('2026-12-02')).toBe('check holds until today');
    expect(due('2026-12-01')).toBe('check overdue since yesterday');
    expect(due('2026-11-02')).toBe('check overdue by 30 days');
    expect(due('2027-03-01')).toBe('check holds until 2027-03-01');
  });

  it('says with its arithmetic that steps are too coarse', () => {
    expect(gearFor(need, [gauge('G-7', 1, '2027-03-01')], now)[0]?.coarse).toBe(
      "Steps of 1 kPa where 0.2 kPa are needed: 1 \u00f7 0.2 = 5 times too coarse. Near a band's edge it will be too close to call.",
    );
    expect(gearFor(need, [gauge('G-12', 0.2, '2027-03-01')], now)[0]?.coarse).toBeUndefined();
  });

  it('converts the steps of an instrument in another unit', () => {
    const psi = gauge('P-1', 0.1, '2027-03-01', {
      shows: [{ unit: 'psi', sense: 'gauge', low: 0, high: 9, resolution: 0.1, accuracy: 0.05 }],
    });
    expect(gearFor(need, [psi], now)[0]?.coarse).toContain('Steps of 0.689 kPa where 0.2 kPa are needed');
  });

  it('leaves out other kinds and what is out of use', () => {
    const gear = [
      gauge('G-1', 0.1, '2027-03-01', { inUse: false }),
      gauge('S-1', 0.1, '2027-03-01', { kind: 'scan-tool' }),
    ];
    expect(gearFor(need, gear, now)).toEqual([]);
  });
});
