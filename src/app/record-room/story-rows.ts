import { shownUnit, type NamedValue } from '../../../procedures/engine/showing';
import type { JudgedResult, Step } from '../../../procedures/document';
import { resultWords } from '../shared/result-words';
import type { Passage, SaidLine, StoryLine, ValueLine, WayLine } from './story-line';

/** A row of the table: the step's own, a value's, or any other line's. */
export type StoryRow =
  HeadRow | ValueRow | CautionsRow | { readonly kind: 'line'; readonly line: Exclude<StoryLine, ValueLine> };

/** Cautions that were acknowledged one after another: counted, and read on demand. */
export interface CautionsRow {
  readonly kind: 'cautions';
  readonly at: number;
  readonly lines: readonly SaidLine[];
}

/** The step's row, where no lone value stands in it. */
export interface HeadRow {
  readonly kind: 'head';
  readonly at: number;
  /** Why it went on as the author wrote: said beside the step, since the next row is where it led. */
  readonly aside: string | undefined;
}

export interface ValueRow {
  readonly kind: 'value';
  readonly at: number;
  /** Whether it is the step's own row: then the step's title stands in it, else the quantity's label. */
  readonly isHead: boolean;
  /** What the value is called, where the step's title does not say it. */
  readonly label: string | undefined;
  readonly value: NamedValue;
  readonly text: string;
  readonly unit: string;
  /** The band's ends and the value in the value's base unit. */
  readonly band: {
    readonly low?: number;
    readonly high?: number;
    readonly lowText?: string;
    readonly highText?: string;
  };
  readonly hasBand: boolean;
  readonly result: JudgedResult | undefined;
  readonly words: string;
  readonly takes: string | undefined;
  readonly takenAgainAt: number | undefined;
}

/** A claim as the table shows it: a lone value stands in the step's own row, everything else in rows below. */
export function rowsOf(passage: Passage): readonly StoryRow[] {
  const values = passage.lines.filter((line) => line.kind === 'value');
  const lone = values.length === 1 ? values[0] : undefined;
  const plainWay = lone === undefined ? passage.lines.find(isPlainWay) : undefined;
  const head: StoryRow =
    lone === undefined
      ? { kind: 'head', at: passage.at, aside: plainWay?.way.because }
      : valueRow(lone, passage.step, { isHead: true });
  const rest = passage.lines
    .filter((line) => line !== lone && line !== plainWay)
    .reduce<StoryRow[]>((rows, line) => {
      const last = rows.at(-1);
      if (line.kind === 'value') return [...rows, valueRow(line, passage.step, { isHead: false })];
      if (line.kind !== 'said' || line.type !== 'caution-acknowledged') return [...rows, { kind: 'line', line }];
      if (last?.kind !== 'cautions') return [...rows, { kind: 'cautions', at: line.at, lines: [line] }];
      return [...rows.slice(0, -1), { ...last, lines: [...last.lines, line] }];
    }, []);
  return [head, ...rest];
}

/** A way that no condition decided, that no person chose, and that says nothing of a finding. */
export function isPlainWay(line: StoryLine): line is WayLine {
  if (line.kind !== 'way' || line.insteadOf !== undefined || line.verdict !== undefined) return false;
  return line.way.exit === 'otherwise' && line.to?.kind !== 'finding';
}

function valueRow(line: ValueLine, step: Step | undefined, { isHead }: { readonly isHead: boolean }): ValueRow {
  const { value } = line;
  const { low, high, lowText, highText, result } = value.judgement ?? {};
  return {
    kind: 'value',
    at: line.at,
    isHead,
    label: isHead && isRead(step) ? undefined : value.label,
    value,
    text: valueText(value),
    unit: shownUnit(value.unit),
    band: { low, high, lowText, highText },
    hasBand: low !== undefined || high !== undefined,
    result,
    words: judgementText(value, step),
    takes: line.takes.length === 0 ? undefined : `mean of ${line.takes.length}: ${line.takes.join(', ')}`,
    takenAgainAt: line.takenAgainAt,
  };
}

/** A step that reads one quantity is called after it. */
function isRead(step: Step | undefined): boolean {
  return step?.kind === 'reading' || step?.kind === 'wait';
}

/** `93.9 ± 0.3 kPa`, with as many digits as the reading had. */
export function valueText(value: NamedValue): string {
  const spread = value.uncertaintyText === '0' ? '' : ` ± ${value.uncertaintyText}`;
  return `${value.text}${spread} ${shownUnit(value.unit)}`.trim();
}

/** What is said beside the gauge: the judgement, or why there is none, or how the value came to be known. */
function judgementText(value: NamedValue, step: Step | undefined): string {
  const result = value.judgement?.result;
  if (result !== undefined) return resultWords[result];
  return value.judgement?.unjudged ?? wayLabel(value, step) ?? sourceWords[value.source];
}

/** How the value is known, where the step offered several ways. */
function wayLabel(value: NamedValue, step: Step | undefined): string | undefined {
  const reads = step?.kind === 'reading' || step?.kind === 'wait' ? step.reads : [];
  const ways = reads.find((quantity) => quantity.name === value.name)?.ways ?? [];
  return ways.find((way) => way.id === value.way)?.label;
}

const sourceWords: Readonly<Record<NamedValue['source'], string>> = {
  typed: 'no band',
  file: 'no band, from a file',
  simulated: 'no band, simulated',
  computed: 'computed',
};
