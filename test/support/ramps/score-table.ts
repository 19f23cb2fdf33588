import { type RampScore } from './ramp-score';

const columns: readonly [title: string, width: number, cell: (score: RampScore) => string][] = [
  ['condition', 54, ({ condition }) => condition],
  ['sealed %', 9, ({ sealed, ramps }) => percent(sealed, ramps)],
  ['covered %', 10, ({ covered, sealed }) => percent(covered, sealed)],
  ['bias kPa', 9, ({ meanErrorKpa }) => kilopascals(meanErrorKpa)],
  ['error kPa', 10, ({ meanSizeKpa }) => kilopascals(meanSizeKpa)],
  ['worst kPa', 10, ({ worstKpa }) => kilopascals(worstKpa)],
  ['U kPa', 8, ({ meanUncertaintyKpa }) => kilopascals(meanUncertaintyKpa)],
];

const percent = (part: number, whole: number): string => (whole === 0 ? '-' : ((100 * part) / whole).toFixed(1));
const kilopascals = (value: number): string => (Number.isFinite(value) ? value.toFixed(3) : '-');

/** The scores as a table for the eye, with the reasons of those that were not called sealed. */
export function scoreTable(title: string, scores: readonly RampScore[]): string {
  const cells = (texts: readonly string[]): string =>
    texts.map((text, index) => (index === 0 ? text.padEnd(54) : text.padStart(columns[index]?.[1] ?? 0))).join('');
  const reasons = ({ refusals }: RampScore): string =>
    Object.entries(refusals)
      .map(([reason, count]) => `${reason} ${count}`)
      .join(', ');
  return [
    `${title} (${scores[0]?.ramps ?? 0} ramps each)`,
    cells(columns.map(([name]) => name)),
    ...scores.map((score) => `${cells(columns.map(([, , cell]) => cell(score)))}  ${reasons(score)}`.trimEnd()),
    '',
  ].join('\n');
}
