import {
  shownUnit,
  type EventOf,
  type RunEvent,
  type Series,
  type SeriesState,
} from '../../../procedures/engine/showing';
import type { Channel, Step } from '../../../procedures/document';
import type { PointsLine, StoryLine, TypedPoint } from './story-line';

/** What is typed into a ramp during one claim, gathered event by event. */
export interface GatheredPoints {
  readonly points: readonly TypedPoint[];
  readonly marks: SeriesState['marks'];
  /** When the first point came in. */
  readonly at: number;
}

export const noPoints: GatheredPoints = { points: [], marks: {}, at: 0 };

/** The same with one more event. A point that is taken back stays, and says so. */
export function withEvent(gathered: GatheredPoints, event: RunEvent): GatheredPoints {
  switch (event.type) {
    case 'reading-recorded':
      return event.data.timeS === undefined ? gathered : withPoint(gathered, event, event.data.timeS);
    case 'mark-placed': {
      const { mark, timeS, by } = event.data;
      return { ...gathered, marks: { ...gathered.marks, [mark]: { timeS, seq: event.seq, by } } };
    }
    case 'undone': {
      const points = gathered.points.map((point) =>
        point.seq === event.data.seq ? { ...point, isTakenBack: true } : point,
      );
      return { ...gathered, points };
    }
    default:
      return gathered;
  }
}

function withPoint(gathered: GatheredPoints, event: EventOf<'reading-recorded'>, timeS: number): GatheredPoints {
  const { name, figure } = event.data;
  if (!isChannel(name)) return gathered;
  const point: TypedPoint = { seq: event.seq, timeS, channel: name, ...figure, isTakenBack: false };
  return {
    ...gathered,
    points: [...gathered.points, point],
    at: gathered.points.length === 0 ? event.at : gathered.at,
  };
}

const channels: readonly string[] = ['gauge', 'manifold', 'boost', 'sound'] satisfies readonly Channel['name'][];

function isChannel(name: string): name is Channel['name'] {
  return channels.includes(name);
}

/**
 * The points of a claim that no kept series holds: all of them where none was kept of what was typed, else those taken
 * back. None where every point counts.
 */
export function pointsLine({ points, marks, at }: GatheredPoints, lines: readonly StoryLine[]): PointsLine | undefined {
  const isKept = lines.some((line) => line.kind === 'series' && line.record.source === 'typed');
  const uncounted = isKept ? points.filter(({ isTakenBack }) => isTakenBack) : points;
  const [first] = uncounted;
  return first === undefined ? undefined : { kind: 'points', seq: first.seq, at, points: uncounted, marks };
}

/** The points as a series, one time axis, each channel where it was typed; later ones at the same time stand. */
export function seriesOfPoints(points: readonly TypedPoint[]): Series {
  const times = [...new Set(points.map(({ timeS }) => timeS))].sort((a, b) => a - b);
  const names = [...new Set(points.map(({ channel }) => channel))];
  return {
    timeS: times,
    channels: names.map((name) => {
      const own = points.filter(({ channel }) => channel === name);
      const values = new Map(own.map(({ timeS, text }) => [timeS, Number(text)]));
      return { name, unit: own[0]?.unit ?? '1', values: times.map((time) => values.get(time)) };
    }),
  };
}

/** The names of a series step's channels as people say them. */
export function channelLabels(step: Step | undefined): Readonly<Record<string, string>> {
  const channels = step?.kind === 'listen' || step?.kind === 'ramp' ? step.channels : [];
  return Object.fromEntries(channels.map(({ name, label }) => [name, label]));
}

/** `25.9 s`, and the value with its unit. */
export function pointTexts({ timeS, text, unit }: TypedPoint): { readonly time: string; readonly value: string } {
  return { time: `${timeS.toFixed(1)} s`, value: `${text} ${shownUnit(unit)}`.trim() };
}
