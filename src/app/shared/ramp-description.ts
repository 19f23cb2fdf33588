import type { Series } from '../../../procedures/engine/showing';

/** What a mark says, for the description. */
export interface DescribedMark {
  readonly label: string;
  readonly timeS: number;
}

/** A series in words: how long, from where to where each channel went, and where the marks lie. */
export function describeRamp(
  series: Series,
  marks: readonly DescribedMark[],
  names: Readonly<Record<string, string>>,
): string {
  const first = series.timeS[0];
  const last = series.timeS.at(-1);
  if (first === undefined || last === undefined) return 'No samples yet';
  const channels = series.channels.flatMap(({ name, unit, values }) => {
    const known = values.filter((value) => value !== undefined);
    const start = known[0];
    const end = known.at(-1);
    if (start === undefined || end === undefined) return [];
    const highest = known.reduce((most, value) => Math.max(most, value), -Infinity);
    return [`${names[name] ?? name} from ${short(start)} to ${short(end)} ${unit}, highest ${short(highest)}`];
  });
  const said = marks.map(({ label, timeS }) => `${label} at ${short(timeS)} s`);
  return [`${series.timeS.length} samples over ${short(last - first)} s`, ...channels, ...said].join('; ');
}

const short = (figure: number): string => String(Number(figure.toFixed(1)));
