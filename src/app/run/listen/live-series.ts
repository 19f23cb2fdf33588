import type { EventOf, RunEvent, RunState, Series, Take } from '../../../../procedures/engine/showing';
import type { SeriesStep } from '../../../../procedures/document';

/** A series' mark. */
export type MarkName = 'noise-begins' | 'noise-stops';

/**
 * The run's monotonic time, in milliseconds, that is second 0 of the points and marks typed after an event: the claim of
 * the step, or the limit after which the ramp began anew. Undefined before the first one.
 */
export function timeBase(events: readonly RunEvent[], afterSeq: number): number | undefined {
  const first = events.find(
    (event): event is EventOf<'reading-recorded'> | EventOf<'mark-placed'> =>
      event.seq > afterSeq &&
      ((event.type === 'reading-recorded' && event.data.timeS !== undefined) || event.type === 'mark-placed'),
  );
  return first === undefined ? undefined : first.elapsed - (first.data.timeS ?? 0) * 1000;
}

/** The event after which the current ramp was begun. */
export function rampSince({ current, exceeded }: Pick<RunState, 'current' | 'exceeded'>): number {
  return Math.max(current?.claimedSeq ?? 0, exceeded.at(-1)?.seq ?? 0);
}

/** The typed points of a claim as a series: one time axis, each channel where it was typed. */
export function seriesOfTakes(step: SeriesStep, takes: Readonly<Record<string, readonly Take[]>>): Series {
  const typed = step.channels.flatMap((channel) => {
    const points = (takes[channel.name] ?? []).filter(({ timeS }) => timeS !== undefined);
    return points.length === 0 ? [] : [{ channel, points }];
  });
  const times = [...new Set(typed.flatMap(({ points }) => points.map(({ timeS }) => timeS ?? 0)))].sort(
    (a, b) => a - b,
  );
  return {
    timeS: times,
    channels: typed.map(({ channel, points }) => {
      const values = new Map(points.map(({ timeS, text }) => [timeS, Number(text)]));
      return {
        name: channel.name,
        unit: points[0]?.unit ?? channel.unit,
        values: times.map((time) => values.get(time)),
      };
    }),
  };
}

/** The series with each absolute channel counted from its own first value, so that all pressures are rises. */
export function risesOf(series: Series, step: SeriesStep): Series {
  const absolute = new Set(step.channels.filter(({ sense }) => sense === 'absolute').map(({ name }) => name));
  return {
    ...series,
    channels: series.channels.map((channel) => {
      const first = channel.values.find((value) => value !== undefined);
      if (first === undefined || !absolute.has(channel.name)) return channel;
      return { ...channel, values: channel.values.map((value) => (value === undefined ? undefined : value - first)) };
    }),
  };
}

/** How much the tiles add to the gauge: its display's own step, about a half, and about a whole of its unit. */
export function stepsFor(resolution: number): readonly number[] {
  if (resolution >= 1) return [resolution, 2 * resolution, 5 * resolution];
  const near = (whole: number): number => Number((Math.max(1, Math.round(whole / resolution)) * resolution).toFixed(4));
  return [...new Set([resolution, near(0.5), near(1)])];
}

/** A figure raised by a step, with as many decimals as the display has. */
export function raised(text: string, step: number, resolution: number): string {
  const decimals = /\.(\d+)$/.exec(String(resolution))?.[1]?.length ?? 0;
  return (Number(text) + step).toFixed(decimals);
}

/** Rise in a second over the last points, at least some seconds of them; undefined while there are too few. */
export function riseRate({ timeS, channels }: Series): number | undefined {
  const values = channels.find(({ name }) => name === 'gauge')?.values ?? [];
  const known = timeS.flatMap((time, index) => {
    const value = values[index];
    return value === undefined ? [] : [{ time, value }];
  });
  const last = known.at(-1);
  const before = last === undefined ? undefined : [...known].reverse().find(({ time }) => last.time - time >= 4);
  if (last === undefined || before === undefined) return undefined;
  return (last.value - before.value) / (last.time - before.time);
}

/** The state as it would be with a mark at another time: for looking before anything is recorded. */
export function withMark(state: RunState, series: string, mark: MarkName, timeS: number, by = 'tap'): RunState {
  const known = state.series[series] ?? { step: state.current?.id ?? '', seq: state.seq, marks: {} };
  return {
    ...state,
    series: { ...state.series, [series]: { ...known, marks: { ...known.marks, [mark]: { timeS, seq: 0, by } } } },
  };
}

/** The value of a channel at a time, between its samples; undefined outside of them. */
export function valueAt({ timeS, channels }: Series, name: string, at: number): number | undefined {
  const values = channels.find((channel) => channel.name === name)?.values ?? [];
  let before: { time: number; value: number } | undefined;
  for (const [index, time] of timeS.entries()) {
    const value = values[index];
    if (value === undefined) continue;
    if (time === at) return value;
    if (time > at) {
      if (before === undefined) return undefined;
      return before.value + ((at - before.time) / (time - before.time)) * (value - before.value);
    }
    before = { time, value };
  }
  return undefined;
}
