import { convert, isUnit } from '../../../procedures/calculations/for-a-run';
import type { Series } from '../../../procedures/engine/showing';

/** Channels that are absolute pressures; the gauge's is a rise already. */
const absolute: ReadonlySet<string> = new Set(['manifold', 'boost']);

/**
 * The series with its absolute pressures as rises above the air of the place, so that they lie on the gauge's own
 * scale. Without the air of the place (kilopascals), as it is.
 */
export function risesAbove(series: Series, stationKpa: number | undefined): Series {
  if (stationKpa === undefined) return series;
  return {
    timeS: series.timeS,
    channels: series.channels.map((channel) => {
      const { name, unit, values } = channel;
      if (!absolute.has(name) || !isUnit(unit)) return channel;
      const station = convert(stationKpa, 'kPa', unit);
      return { name, unit, values: values.map((value) => (value === undefined ? undefined : value - station)) };
    }),
  };
}
