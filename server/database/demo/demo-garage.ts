import type { Instrument } from '../../gear/gear.entity';
import type { Role } from '../../http/route';

/** The fictional garage that the demo shows. Every name and number in here is invented. */

export const demoPassword = 'ossenholt-demo';

const ossenholt = '0197f3a0-0000-7000-8000-000000000001';
const quay = '0197f3a0-0000-7000-8000-000000000002';

export const demoSites = [
  { id: ossenholt, name: 'Ossenholt', elevationM: 640 },
  { id: quay, name: 'Ossenholt Quay', elevationM: 3 },
];

const person = (digit: number, name: string, displayName: string, role: Role) => ({
  id: `0197f3a0-0000-7000-8000-00000000001${digit}`,
  siteId: ossenholt,
  name,
  displayName,
  role,
});

export const demoPeople = [
  person(1, 'okafor', 'I. Okafor', 'technician'),
  person(2, 'adeyemi', 'R. Adeyemi', 'lead'),
  person(3, 'brandt', 'T. Brandt', 'apprentice'),
  person(4, 'lindqvist', 'M. Lindqvist', 'manager'),
];

/** Who published the procedures that the garage starts with. */
export const demoLeadId = '0197f3a0-0000-7000-8000-000000000012';
const demoTechnicianId = '0197f3a0-0000-7000-8000-000000000011';

type Shelved = Pick<Instrument, 'kind' | 'label' | 'serial' | 'shows'> & { readonly checkedDaysAgo: number };

const gaugeRange = (high: number, resolution: number, accuracy: number): Instrument['shows'] => [
  { unit: 'kPa', sense: 'gauge', low: 0, high, resolution, accuracy },
];
const absoluteRange = (low: number, high: number, resolution: number, accuracy: number): Instrument['shows'] => [
  { unit: 'kPa', sense: 'absolute', low, high, resolution, accuracy },
];
const temperatureRange = (low: number, high: number, resolution: number, accuracy: number): Instrument['shows'] => [
  { unit: 'degC', low, high, resolution, accuracy },
];
const scanToolRanges = [...absoluteRange(10, 255, 0.1, 0.5), ...temperatureRange(-40, 215, 1, 1)];

const shelf = (
  kind: Instrument['kind'],
  label: string,
  serial: string,
  shows: Instrument['shows'],
  checkedDaysAgo: number,
): Shelved => ({ kind, label, serial, shows, checkedDaysAgo });

/** Days for which a check holds. */
const checkHoldsDays = 365;

const shelves: readonly (readonly [string, readonly Shelved[]])[] = [
  [
    ossenholt,
    [
      shelf('pressure-gauge', 'G-12', 'PG60-0412', gaugeRange(60, 0.1, 0.25), 120),
      shelf('pressure-gauge', 'G-7', 'PG100-0077', gaugeRange(100, 1, 1.5), 200),
      shelf('pressure-gauge', 'G-3', 'PG60-0103', gaugeRange(60, 0.1, 0.25), checkHoldsDays + 30),
      shelf('scan-tool', 'S-3', 'ST-2203', scanToolRanges, 60),
      shelf('listening-probe', 'L-2', 'LP-0021', [], 90),
      shelf('barometer', 'B-1', 'BA-0008', absoluteRange(80, 110, 0.1, 0.15), 150),
      shelf('thermometer', 'T-4', 'TH-0415', temperatureRange(-20, 150, 0.1, 0.5), 30),
    ],
  ],
  [
    quay,
    [
      shelf('pressure-gauge', 'G-21', 'PG60-0521', gaugeRange(60, 0.1, 0.25), 40),
      shelf('scan-tool', 'S-5', 'ST-2205', scanToolRanges, 75),
      shelf('barometer', 'B-2', 'BA-0011', absoluteRange(80, 110, 0.1, 0.15), 20),
    ],
  ],
];

/** The gear of both sites, its checks counted back from today. */
export function demoGear(today: Date): readonly Omit<Instrument, never>[] {
  return shelves.flatMap(([siteId, items], site) =>
    items.map(({ checkedDaysAgo, ...item }, index) => ({
      ...item,
      id: `0197f3a0-0000-7000-8000-000000000${site + 1}${String(index + 1).padStart(2, '0')}`,
      siteId,
      lastCheckedOn: dayFrom(today, -checkedDaysAgo),
      dueOn: dayFrom(today, checkHoldsDays - checkedDaysAgo),
      inUse: true,
    })),
  );
}

/** The car that waits in the morning. */
export function demoVisit(now: Date) {
  const openedAt = now.getTime();
  return {
    id: '0197f3a0-0000-7000-8000-000000000301',
    siteId: ossenholt,
    vin: '1ZZBT4CK4LR204817',
    repairOrder: '4417',
    odometer: { text: '84210', unit: 'km' },
    concern: 'Whistle at idle, hesitates under load',
    codes: ['P0068'],
    car: {
      make: 'Merrow',
      model: 'Heron',
      colour: 'silver',
      engine: '1.6 L turbo petrol',
      displacementL: '1.6',
      year: 2020,
    },
    openedBy: demoTechnicianId,
    openedAt,
    changedAt: openedAt,
  };
}

function dayFrom(today: Date, days: number): string {
  return new Date(today.getTime() + days * 86_400_000).toISOString().slice(0, 10);
}
