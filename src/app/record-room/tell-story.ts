import type { CompiledProcedure, Step } from '../../../procedures/document';
import {
  applyEvent,
  renderTemplate,
  type EventOf,
  type NamedValue,
  type RunEvent,
  type RunHeader,
  type RunState,
} from '../../../procedures/engine/showing';
import { acknowledged, sayEvent } from './event-words';
import { noPoints, pointsLine, withEvent, type GatheredPoints } from './typed-points';
import type { Passage, SaidLine, Story, StoryLine, ValueLine } from './story-line';

/** A run retold, with the state that the retelling ended in. */
export interface ToldRun {
  readonly story: Story;
  readonly state: RunState | undefined;
}

/**
 * Retells a run by replaying it: each event adds its line to the claim that was open, and each value is judged as the
 * core judges it now. Where an event does not fit, the story says so and ends there.
 */
export function tellStory(procedure: CompiledProcedure, header: RunHeader, events: readonly RunEvent[]): ToldRun {
  const passages: OpenPassage[] = [];
  let state: RunState | undefined;
  for (const event of events) {
    const result = applyEvent(procedure, header, state, event);
    if (!result.ok) {
      const { seq, what } = result.refusal;
      return { story: { passages: close(procedure, passages, state), brokenOff: { seq, what } }, state };
    }
    if (passages.length === 0 || begins(event)) passages.push(open(procedure, event));
    const passage = passages.at(-1);
    passage?.lines.push(
      ...linesOf(procedure, event, state, result.state),
      ...endedReadings(event, state, result.state),
    );
    if (passage !== undefined) {
      passage.gathered = withEvent(passage.gathered, event);
      refreshMarks(passage, result.state);
    }
    state = result.state;
  }
  return { story: { passages: close(procedure, passages, state) }, state };
}

interface OpenPassage {
  readonly seq: number;
  readonly at: number;
  readonly step: Step | undefined;
  lines: StoryLine[];
  gathered: GatheredPoints;
}

function begins(event: RunEvent): boolean {
  return event.type === 'step-claimed' || event.type === 'branch-overruled' || event.type === 'finding-reached';
}

function open(procedure: CompiledProcedure, event: RunEvent): OpenPassage {
  const isOfStep = event.type === 'step-claimed' || event.type === 'branch-overruled';
  const id = isOfStep ? event.data.step : event.type === 'finding-reached' ? event.data.finding : undefined;
  return {
    seq: event.seq,
    at: event.at,
    step: id === undefined ? undefined : procedure.step(id),
    lines: [],
    gathered: noPoints,
  };
}

function linesOf(
  procedure: CompiledProcedure,
  event: RunEvent,
  before: RunState | undefined,
  after: RunState,
): readonly StoryLine[] {
  const { seq, at } = event;
  switch (event.type) {
    case 'series-recorded':
      return [{ kind: 'series', seq, at, record: event.data, marks: {} }];
    case 'photo-attached':
      return [{ kind: 'photo', seq, at, record: event.data }];
    case 'codes-recorded': {
      const step = procedure.step(event.data.step);
      const earlier =
        step?.kind === 'codes' && step.comparedWith !== undefined ? before?.codes[step.comparedWith] : undefined;
      return [
        {
          kind: 'codes',
          seq,
          at,
          codes: event.data.codes,
          ...(earlier === undefined ? {} : { before: earlier.codes }),
        },
      ];
    }
    case 'branch-taken': {
      const to = procedure.step(event.data.to);
      const insteadOf = before?.overruled === undefined ? undefined : overruledWords(procedure, before);
      const verdict = event.data.verdict === undefined ? undefined : procedure.step(event.data.verdict);
      return [
        {
          kind: 'way',
          seq,
          at,
          way: event.data,
          ...(to === undefined ? {} : { to }),
          ...(insteadOf === undefined ? {} : { insteadOf }),
          ...(verdict === undefined ? {} : { verdict }),
        },
      ];
    }
    case 'step-done':
      return [
        ...endOfNoise(procedure.step(event.data.step), event, after),
        ...foundThere(procedure, event, before),
        ...valuesOf(after, event),
      ];
    case 'alert-acknowledged':
      return [{ kind: 'said', seq, at, type: event.type, ...acknowledged(procedure, before) }];
    default: {
      const said = sayEvent(procedure, event);
      const values = valuesOf(after, event);
      return said === undefined ? values : [{ kind: 'said', seq, at, type: event.type, ...said }, ...values];
    }
  }
}

/** The way that the conditions had led to before a person chose another. */
function overruledWords(procedure: CompiledProcedure, state: RunState): string | undefined {
  const way = state.walked.at(-1)?.way;
  if (way === undefined) return undefined;
  const title = (id: string): string => procedure.step(id)?.title ?? id;
  return way.verdict === undefined ? title(way.to) : `${title(way.to)}, heading for ${title(way.verdict)}`;
}

/** A listen step that found no seal point says so: silence in the record could be taken for an oversight. */
function endOfNoise(step: Step | undefined, { seq, at, type }: RunEvent, after: RunState): readonly SaidLine[] {
  if (step?.kind !== 'listen') return [];
  const sought = step.finds.find((found) => found.what === 'seal-point');
  if (sought === undefined || after.values[sought.name] !== undefined) return [];
  return [{ kind: 'said', seq, at, type, tone: 'live', what: 'No end of the noise was marked' }];
}

/** What a called procedure found, said where the run comes back from it. */
function foundThere(
  procedure: CompiledProcedure,
  { seq, at, type, data }: EventOf<'step-done'>,
  before: RunState | undefined,
): readonly SaidLine[] {
  if (before?.verdict === undefined || procedure.step(data.step)?.kind !== 'call') return [];
  const finding = procedure.step(before.verdict);
  if (finding?.kind !== 'finding' || procedure.blockOf(finding.id)?.call !== data.step) return [];
  const words = renderTemplate(procedure, before, finding.verdict) ?? finding.title;
  return [{ kind: 'said', seq, at, type, tone: 'plain', what: 'What the called procedure found', words }];
}

/** Readings that stopped holding with this event: what was decided before rests on them still, nothing after does. */
function endedReadings(
  { seq, at, type }: RunEvent,
  before: RunState | undefined,
  after: RunState,
): readonly SaidLine[] {
  if (before === undefined || before.values === after.values) return [];
  return Object.values(after.values).flatMap(({ name, label, stale }): readonly SaidLine[] => {
    if (stale === undefined || before.values[name]?.stale !== undefined) return [];
    return [{ kind: 'said', seq, at, type, tone: 'live', what: `No longer holds: ${label}`, words: stale.because }];
  });
}

/** The values that this event gave: a take completed them, or the step's results were computed. */
function valuesOf(after: RunState, { seq, at }: RunEvent): readonly ValueLine[] {
  return Object.values(after.values)
    .filter((value) => value.seq === seq)
    .map((value) => ({ kind: 'value', seq, at, value, takes: takesOf(after, value) }));
}

function takesOf(state: RunState, value: NamedValue): readonly string[] {
  if (value.takes < 2) return [];
  const takes = state.current?.takes[value.name] ?? [];
  return takes.slice(-value.takes).map((take) => take.text);
}

/** Marks may be placed before the series is kept and after it: the line shows those that stand now. */
function refreshMarks(passage: OpenPassage, state: RunState): void {
  passage.lines = passage.lines.map((line) => {
    if (line.kind !== 'series') return line;
    const series = state.series[line.record.name];
    return series?.step === passage.step?.id && series !== undefined ? { ...line, marks: series.marks } : line;
  });
}

function close(
  procedure: CompiledProcedure,
  passages: readonly OpenPassage[],
  state: RunState | undefined,
): readonly Passage[] {
  const later = new Map<string, number>();
  const closed: Passage[] = [];
  for (const passage of [...passages].reverse()) {
    const lines = withPoints(passage)
      .reverse()
      .map((line) => (line.kind === 'value' ? withTakenAgain(line, later) : line));
    closed.push(closePassage(procedure, passage, lines.reverse(), state));
  }
  return closed.reverse();
}

/** The lines, with what was typed and does not count where it began. */
function withPoints({ lines, gathered }: OpenPassage): StoryLine[] {
  const line = pointsLine(gathered, lines);
  if (line === undefined) return [...lines];
  const before = lines.filter(({ seq }) => seq < line.seq);
  return [...before, line, ...lines.slice(before.length)];
}

function withTakenAgain(line: ValueLine, later: Map<string, number>): ValueLine {
  const takenAgainAt = later.get(line.value.name);
  later.set(line.value.name, line.at);
  return takenAgainAt === undefined ? line : { ...line, takenAgainAt };
}

function closePassage(
  procedure: CompiledProcedure,
  passage: OpenPassage,
  lines: readonly StoryLine[],
  state: RunState | undefined,
): Passage {
  const { seq, at, step } = passage;
  const call = step === undefined ? undefined : procedure.blockOf(step.id)?.call;
  const within = call === undefined ? undefined : procedure.step(call);
  const claim = state?.walked.find((candidate) => candidate.claimedSeq === seq);
  const unjudged = claim?.notMeasured === true ? 'not-measured' : claim?.doneSeq === undefined ? undefined : 'done';
  const result = claim?.result ?? unjudged;
  return {
    seq,
    at,
    lines,
    ...(within === undefined ? {} : { within }),
    isLeft: claim?.isLeft ?? false,
    ...(step === undefined ? {} : { step }),
    ...(result === undefined ? {} : { result }),
  };
}
