import { convert } from '../../../procedures/calculations/for-a-run';
import type { CompiledProcedure, FindingResult } from '../../../procedures/document';
import { shownUnit, type EventOf, type RunEvent, type RunState } from '../../../procedures/engine/showing';
import type { BenchEntry, PracticeScenario } from '../shared/practice/practice-scenario';

/** What a practice run found, held against what was planted. */
export interface Debrief {
  readonly finding: ComparedFinding;
  readonly mark: ComparedMark;
  /** Figures that were typed, against what the bench showed, in the order of the run. */
  readonly figures: readonly ComparedFigure[];
  readonly stepsWalked: number;
  readonly minutes: number;
}

export interface ComparedFinding {
  readonly result: FindingResult;
  /** The titles of the findings; `reached` is absent where the run has none. */
  readonly reached: string | undefined;
  readonly planted: string;
  readonly words: string;
}

export interface ComparedMark {
  readonly result: FindingResult;
  readonly words: string;
}

export interface ComparedFigure {
  readonly label: string;
  readonly written: string;
  readonly shown: string;
  readonly isSame: boolean;
}

/** A mark this near is where the noise stops: a person's reaction and four samples a second; common practice, no source. */
const nearS = 2;
/** Findings that leave the question open. */
const openEnds = new Set(['notCompleted', 'placeNotFound', 'sealsTooClose']);

export function debriefRun(
  procedure: CompiledProcedure,
  scenario: PracticeScenario,
  events: readonly RunEvent[],
  state: RunState,
): Debrief {
  return {
    finding: compareFinding(procedure, scenario, state),
    mark: compareMark(procedure, scenario, state),
    figures: compareFigures(procedure, scenario, events),
    stepsWalked: state.walked.length,
    minutes: Math.max(1, Math.round((state.lastAt - state.openedAt) / 60_000)),
  };
}

function compareFinding(procedure: CompiledProcedure, { planted }: PracticeScenario, state: RunState): ComparedFinding {
  const title = (id: string | undefined): string | undefined =>
    id === undefined ? undefined : procedure.step(id)?.title;
  const reached = title(state.finding);
  const titles = { reached, planted: title(planted.finding) ?? planted.finding };
  if (state.finding === planted.finding) {
    return { ...titles, result: 'in', words: 'You found what was planted.' };
  }
  if (state.finding === undefined || openEnds.has(state.finding)) {
    return {
      ...titles,
      result: 'not-judged',
      words: 'The run was not brought to its end: the fault is still in the car.',
    };
  }
  return { ...titles, result: 'out', words: 'The finding is another one than what was planted.' };
}

function compareMark(procedure: CompiledProcedure, { planted }: PracticeScenario, state: RunState): ComparedMark {
  const listen = procedure.document.steps.find((step) => step.kind === 'listen');
  const series = listen?.kind === 'listen' ? state.series[listen.name] : undefined;
  const markedS = series?.marks['noise-stops']?.timeS;
  const stops = planted.noiseStops;
  if (series === undefined) return { result: 'not-judged', words: 'The ramp was not taken.' };
  if (stops === undefined) {
    return markedS === undefined
      ? { result: 'in', words: 'The noise never stops, and you marked no end of it.' }
      : { result: 'out', words: `You marked an end of the noise at ${seconds(markedS)}; it never stops.` };
  }
  const place = `it stops at ${seconds(stops.timeS)}, ${stops.gaugeKpa.toFixed(1)} kPa above the air of the place`;
  if (markedS === undefined) return { result: 'out', words: `You marked no end of the noise; ${place}.` };
  const off = markedS - stops.timeS;
  if (Math.abs(off) <= nearS)
    return { result: 'in', words: `You marked the end of the noise at ${seconds(markedS)}; ${place}.` };
  const side = off > 0 ? 'late' : 'early';
  return {
    result: 'out',
    words: `You marked the end of the noise at ${seconds(markedS)}, ${seconds(Math.abs(off))} too ${side}; ${place}.`,
  };
}

function compareFigures(
  procedure: CompiledProcedure,
  scenario: PracticeScenario,
  events: readonly RunEvent[],
): readonly ComparedFigure[] {
  return events.flatMap((event) => {
    if (event.type !== 'reading-recorded' || event.data.source !== 'typed') return [];
    const name = enteredName(procedure, event);
    const shown = scenario.bench[event.data.step]?.find((entry) => entry.what === 'figure' && entry.name === name);
    return shown?.what === 'figure' ? [compareFigure(event, shown)] : [];
  });
}

/** The entry's own name where the quantity was known by a way, else the quantity's. */
function enteredName(procedure: CompiledProcedure, { data }: EventOf<'reading-recorded'>): string {
  const step = procedure.step(data.step);
  const reads = step?.kind === 'reading' || step?.kind === 'wait' ? step.reads : [];
  const way = reads.find(({ name }) => name === data.name)?.ways?.find(({ id }) => id === data.way);
  return way?.entry?.name ?? data.name;
}

function compareFigure(
  { data }: EventOf<'reading-recorded'>,
  shown: Extract<BenchEntry, { what: 'figure' }>,
): ComparedFigure {
  const { text, unit } = data.figure;
  const written = convert(Number(text), unit, shown.unit);
  return {
    label: shown.label,
    written: `${text} ${shownUnit(unit)}`,
    shown: `${shown.text} ${shownUnit(shown.unit)}`,
    // What was written in another unit has been rounded on the way.
    isSame: Math.abs(written - Number(shown.text)) < (unit === shown.unit ? 1e-9 : 0.06),
  };
}

function seconds(time: number): string {
  return `${time.toFixed(1)} s`;
}
