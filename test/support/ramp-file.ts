import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { encodeSeries, sha256Hex, type RunCommand, type Series } from '../../procedures/engine';

const columns = [
  { name: 'gauge', column: 'gauge_kpa', unit: 'kPa' },
  { name: 'manifold', column: 'map_kpa', unit: 'kPa' },
  { name: 'boost', column: 'boost_kpa', unit: 'kPa' },
  { name: 'sound', column: 'sound_db', unit: 'dB' },
] as const;

/** Reads a ramp of test/reference/ramps: `readRamp('demo-warm-seals')`. */
export function readRamp(name: string): Series {
  const path = join(__dirname, '..', 'reference', 'ramps', `${name}.csv`);
  const [head = '', ...rows] = readFileSync(path, 'utf8').trim().split('\n');
  const titles = head.split(',');
  const cells = rows.map((row) => row.split(','));
  const column = (title: string): (number | undefined)[] => {
    const at = titles.indexOf(title);
    return cells.map((row) => (row[at] === undefined || row[at] === '' ? undefined : Number(row[at])));
  };
  return {
    timeS: column('time_s').map((time) => time ?? Number.NaN),
    channels: columns.map(({ name: channel, column: title, unit }) => ({ name: channel, unit, values: column(title) })),
  };
}

/** The command that keeps a series with the listen step, as the shell gives it for a file. */
export function importOf(series: Series, fileName: string): Extract<RunCommand, { do: 'import-series' }> {
  const bytes = encodeSeries(series);
  return {
    do: 'import-series',
    series,
    record: {
      sha256: sha256Hex(bytes),
      bytes: bytes.length,
      samples: series.timeS.length,
      durationS: (series.timeS.at(-1) ?? 0) - (series.timeS[0] ?? 0),
      channels: series.channels.map(({ name, unit }) => ({ name, unit, column: name })),
      source: 'file',
      fileName,
      skipped: 0,
      problems: [],
    },
  };
}

/** The same ramp with one channel's values changed. */
export function withChannel(
  series: Series,
  name: Series['channels'][number]['name'],
  change: (value: number, gaugeKpa: number) => number,
): Series {
  const gauge = series.channels.find((channel) => channel.name === 'gauge');
  return {
    ...series,
    channels: series.channels.map((channel) =>
      channel.name === name
        ? {
            ...channel,
            values: channel.values.map((value, index) =>
              value === undefined ? undefined : change(value, gauge?.values[index] ?? 0),
            ),
          }
        : channel,
    ),
  };
}

/** The same ramp without one channel. */
export function withoutChannel(series: Series, name: Series['channels'][number]['name']): Series {
  return { ...series, channels: series.channels.filter((channel) => channel.name !== name) };
}

/** The ramp up to the moment at which the gauge first shows more than `gaugeKpa`. */
export function endedAt(series: Series, gaugeKpa: number): Series {
  const gauge = series.channels.find((channel) => channel.name === 'gauge')?.values ?? [];
  const past = gauge.findIndex((value) => value !== undefined && value > gaugeKpa);
  const end = past < 0 ? series.timeS.length : past;
  return {
    timeS: series.timeS.slice(0, end),
    channels: series.channels.map((channel) => ({ ...channel, values: channel.values.slice(0, end) })),
  };
}
