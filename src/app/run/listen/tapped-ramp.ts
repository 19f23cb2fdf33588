import type { RunCommand, SeriesState, Take } from '../../../../procedures/engine/showing';
import type { MarkName } from './live-series';

/** A ramp as the person at it has tapped it, down to the last tap. */
export interface TappedRamp {
  /** The gauge's points. */
  readonly points: readonly Pick<Take, 'text' | 'timeS'>[];
  readonly marks: Partial<Record<MarkName, { readonly timeS: number }>>;
}

/** What counts of the ramp with what was tapped since and is still being written. */
export function tappedRamp(
  written: { readonly points: readonly Take[]; readonly marks: SeriesState['marks'] },
  waiting: readonly RunCommand[],
): TappedRamp {
  return waiting.reduce<TappedRamp>((ramp, command) => {
    switch (command.do) {
      case 'record':
        return command.name === 'gauge' && !isWritten(written.points, command)
          ? { ...ramp, points: [...ramp.points, command] }
          : ramp;
      case 'take-back':
        return { ...ramp, points: ramp.points.slice(0, -1) };
      case 'mark':
        return { ...ramp, marks: { ...ramp.marks, [command.mark]: { timeS: command.timeS } } };
      case 'unmark': {
        const marks = { ...ramp.marks };
        delete marks[command.mark];
        return { ...ramp, marks };
      }
      default:
        return ramp;
    }
  }, written);
}

/** A command leaves the line just after its point counts. */
const isWritten = (points: readonly Take[], { timeS, text }: Pick<Take, 'timeS' | 'text'>): boolean =>
  points.some((point) => point.timeS === timeS && point.text === text);
