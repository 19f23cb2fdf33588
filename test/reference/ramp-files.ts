import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type RampSample } from '../../procedures/calculations';

/** What a recorded ramp was made with. */
export interface RampTruth {
  readonly name: string;
  readonly stationKpa: number;
  /** Undefined for a ramp that never seals. */
  readonly sealTimeS: number | undefined;
  readonly sealGaugeKpa: number;
  readonly tolerance: { readonly timeS: number; readonly gaugeKpa: number; readonly mapKpa: number };
}

const folder = join(__dirname, 'ramps');
const read = (file: string) => readFileSync(join(folder, file), 'utf8');

/** The ramps whose truth gives no tolerance are sampled four times a second: two samples, and as closely as the others. */
const otherwise = { time_s: 0.6, gauge_kpa: 0.2, map_kpa: 0.3 };

/** Every ramp beside its truth. */
export const rampTruths: readonly RampTruth[] = ['truth-open.json', 'truth-demo.json'].flatMap((file) =>
  Object.entries(JSON.parse(read(file)) as Record<string, unknown>).flatMap(([name, entry]) => {
    if (typeof entry !== 'object' || entry === null) return [];
    const truth = entry as Record<string, number | null> & { tolerance?: typeof otherwise };
    const { time_s: timeS, gauge_kpa: gaugeKpa, map_kpa: mapKpa } = truth.tolerance ?? otherwise;
    return {
      name,
      stationKpa: Number(truth['station_kpa'] ?? truth['baro_kpa']),
      sealTimeS: truth['seal_time_s'] ?? undefined,
      sealGaugeKpa: Number(truth['seal_gauge_kpa']),
      // One-kilopascal readings cannot do better than their step.
      tolerance: { timeS, gaugeKpa, mapKpa: name.endsWith('coarse-bus') ? 1 : mapKpa },
    };
  }),
);

/** The samples of a ramp as they were recorded. */
export function rampSamples(name: string): RampSample[] {
  const [, ...rows] = read(`${name}.csv`).trim().split('\n');
  return rows.map((row) => {
    const [timeS = NaN, gaugeKpa = NaN, mapKpa = NaN, boostKpa = NaN, soundDb = NaN] = row.split(',').map(Number);
    return { timeS, gaugeKpa, mapKpa, boostKpa, soundDb };
  });
}
