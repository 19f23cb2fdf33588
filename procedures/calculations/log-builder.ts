import { channelQuantity } from './channel-quantity';
import { isNothing, numberIn, type CellStyle } from './log-cells';
import { unitNamed } from './log-units';
import { type LogProblem, type ScanLog } from './scan-log';

/** So many problems are told one by one; a file that has more has one cause. */
const toldProblems = 100;

/** A log of more cells than this is no log of a ramp or a drive, and would not fit into a tablet's memory. */
const mostCells = 20_000_000;
/** Finer than any logger's clock, and coarser than the binary dust by which decimal times differ. */
const perSecond = 1e6;

interface ChannelDraft {
  readonly name: string;
  unit: string | undefined;
  /** The samples in which it has a number, in their order, and the numbers. */
  readonly samples: number[];
  readonly values: number[];
  readonly refused: LogProblem[];
  readonly firstLine: number;
}

const numberWithUnit = /^([+-]?[\d.,]+(?:e[+-]?\d+)?)\s*([^\d\s].*)$/i;

const shortened = (text: string): string => (text.length > 40 ? `${text.slice(0, 40)}...` : text);

/** Puts a log together row by row, in the order of the file. */
export class LogBuilder {
  private readonly channels = new Map<string, ChannelDraft>();
  private readonly drafts: ChannelDraft[] = [];
  private readonly timesS: number[] = [];
  private readonly problems: LogProblem[] = [];
  private lastTicks: number | undefined;

  constructor(private readonly style: CellStyle) {}

  report(line: number, what: string): void {
    this.problems.push({ line, what });
  }

  /** The time of the last row, or undefined before the first. */
  get lastTimeS(): number | undefined {
    return this.timesS.at(-1);
  }

  /** Whether any channel has a number by now. */
  get hasNumbers(): boolean {
    return this.drafts.some(({ values }) => values.length > 0);
  }

  /**
   * Opens a sample at this time, or goes back to it when it is that of the last one, to the microsecond; tells whether it
   * is the last one. Times never fall.
   */
  openSample(timeS: number): 'new' | 'again' {
    const [start = timeS] = this.timesS;
    const ticks = Math.round((timeS - start) * perSecond);
    if (ticks === this.lastTicks) return 'again';
    this.lastTicks = ticks;
    this.timesS.push(timeS);
    return 'new';
  }

  /** Puts a cell into the open sample; gives false when the channel has a value there already. */
  put(name: string, unit: string | undefined, cell: string, line: number): boolean {
    if (name === '') return true;
    const channel = this.channelOf(name, unit, line);
    const sample = this.timesS.length - 1;
    if (isNothing(cell)) return true;
    const value = this.readNumber(channel, cell);
    if (value === undefined) {
      channel.refused.push({ line, what: `${name}: "${shortened(cell)}" is no number` });
      return true;
    }
    if (channel.samples.at(-1) === sample) return channel.values.at(-1) === value;
    channel.samples.push(sample);
    channel.values.push(value);
    return true;
  }

  /** The log, with time from 0; channels without a single number are left out. */
  finish(): ScanLog {
    const startS = this.timesS[0] ?? 0;
    const { drafts } = this;
    const kept = this.fitting(drafts.filter(({ values }) => values.length > 0));
    for (const { name, values, refused, firstLine } of drafts) {
      if (values.length > 0) for (const problem of refused) this.problems.push(problem);
      else if (refused.length > 0) this.report(firstLine, `${name} holds words and no numbers: left out`);
    }
    return {
      channels: kept.map(({ name, unit }) => ({ name, unit, quantity: channelQuantity(name) })),
      timeS: this.timesS.map((timeS) => Math.round((timeS - startS) * perSecond) / perSecond),
      values: kept.map((channel) => this.inSamples(channel)),
      problems: this.toldProblems(),
    };
  }

  /** As many channels as fit, those with the most numbers, in the order of the file. */
  private fitting(drafts: readonly ChannelDraft[]): readonly ChannelDraft[] {
    const most = Math.max(1, Math.floor(mostCells / Math.max(1, this.timesS.length)));
    if (drafts.length <= most) return drafts;
    const fullest = new Set([...drafts].sort((one, other) => other.values.length - one.values.length).slice(0, most));
    const [left] = drafts.filter((draft) => !fullest.has(draft));
    this.report(
      left?.firstLine ?? 1,
      `${drafts.length} channels are too many: the ${most} with most readings are kept`,
    );
    return drafts.filter((draft) => fullest.has(draft));
  }

  private inSamples({ samples, values }: ChannelDraft): (number | undefined)[] {
    const series = new Array<number | undefined>(this.timesS.length).fill(undefined);
    for (const [index, sample] of samples.entries()) series[sample] = values[index];
    return series;
  }

  private toldProblems(): LogProblem[] {
    const ordered = this.problems.sort((first, second) => first.line - second.line);
    const more = ordered.length - toldProblems;
    const next = ordered[toldProblems];
    if (next === undefined) return ordered;
    return [...ordered.slice(0, toldProblems), { line: next.line, what: `and ${more} more from here on` }];
  }

  /** One quantity may be logged in two units; a header that comes again without its units means the first of them. */
  private channelOf(name: string, unit: string | undefined, line: number): ChannelDraft {
    const key = unit === undefined ? name : `${name}\n${unit}`;
    const known = this.channels.get(key);
    if (known !== undefined) return known;
    const channel: ChannelDraft = { name, unit, samples: [], values: [], refused: [], firstLine: line };
    this.drafts.push(channel);
    this.channels.set(key, channel);
    if (!this.channels.has(name)) this.channels.set(name, channel);
    return channel;
  }

  /** Reads a number, or a number with its unit beside it; the first such unit becomes the channel's. */
  private readNumber(channel: ChannelDraft, cell: string): number | undefined {
    const value = numberIn(cell, this.style.decimalMark);
    if (value !== undefined) return value;
    const [, figures = '', unitText = ''] = numberWithUnit.exec(cell) ?? [];
    const unit = unitNamed(unitText);
    if (unit === undefined || (channel.unit !== undefined && channel.unit !== unit)) return undefined;
    channel.unit = unit;
    return numberIn(figures, this.style.decimalMark);
  }
}
