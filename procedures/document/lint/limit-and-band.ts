import { differenceFromBase, toBase, unitKind } from '../../calculations/for-a-run';
import { truthPart } from '../expression/truth-part';
import type { Limit } from '../procedure-document';
import { isSeriesStep } from '../step-parts';
import { bandedQuantities, type BandedQuantity } from './banded-quantities';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { NominalFigures, shortFigure } from './nominal-figures';

/** Bands, and targets of ramps, that reach beyond a limit of the procedure: a reading in band would raise the alarm. */
export function bandsBeyondLimits(subject: LintSubject): readonly LintFinding[] {
  const figures = new NominalFigures(subject.document);
  const banded = bandedQuantities(subject.document);
  return subject.document.limits.flatMap((limit) => {
    const holds = gaugeTruth(limit, subject);
    if (holds === undefined) return [];
    const bands = banded
      .filter(({ quantity }) => limit.of.includes(quantity.name) && unitKind(quantity.unit) === 'pressure')
      .flatMap((quantity) => beyond(quantity, limit, holds, subject, figures));
    return [...bands, ...targetsBeyond(limit, holds, subject)];
  });
}

type Holds = (gaugePa: number) => boolean | undefined;

function gaugeTruth(limit: Limit, { trees }: LintSubject): Holds | undefined {
  const tree = trees.get(limit.holds);
  if (tree === undefined) return undefined;
  const part = truthPart(tree);
  return (gaugePa) =>
    part({
      number: (name) => (name === 'gauge' ? gaugePa : undefined),
      uncertainty: () => undefined,
      truth: () => false,
      result: () => undefined,
      isMeasured: (name) => name === 'gauge',
    });
}

function beyond(
  { step, quantity, band, pointer }: BandedQuantity,
  limit: Limit,
  holds: Holds,
  { trees }: LintSubject,
  figures: NominalFigures,
): readonly LintFinding[] {
  return (['low', 'high'] as const).flatMap((end): LintFinding[] => {
    const source = band[end];
    const tree = source === undefined ? undefined : trees.get(source);
    if (tree === undefined) return [];
    const isAbsolute = quantity.sense === 'absolute';
    const gaugePa = figures.constantValue([tree], ([value], stationPa) =>
      isAbsolute ? (value ?? Number.NaN) - stationPa : (value ?? Number.NaN),
    );
    if (gaugePa === undefined || holds(gaugePa) !== false) return [];
    const figure = `${shortFigure(differenceFromBase(gaugePa, quantity.unit))} ${quantity.unit}`;
    const above = isAbsolute ? ' above the air of the place' : '';
    const message = `${stepWords(step)}: the ${end} end of the band of ${quantity.name} is ${figure}${above}, beyond the limit ${limit.id} (${limit.holds}). Bring it inside.`;
    return [{ rule: 'limit-and-band', step: step.id, pointer: `${pointer}/${end}`, message }];
  });
}

function targetsBeyond(limit: Limit, holds: Holds, { document }: LintSubject): readonly LintFinding[] {
  return document.steps.flatMap((step, place): LintFinding[] => {
    if (!isSeriesStep(step)) return [];
    const gauge = step.channels.find(({ name }) => name === 'gauge');
    if (gauge === undefined || !limit.of.includes('gauge')) return [];
    if (unitKind(gauge.unit) !== 'pressure' || holds(toBase(step.target, gauge.unit)) !== false) return [];
    const message = `${stepWords(step)}: raises to ${step.target} ${gauge.unit}, beyond the limit ${limit.id} (${limit.holds}). Lower the target.`;
    return [{ rule: 'limit-and-band', step: step.id, pointer: `/steps/${place}/target`, message }];
  });
}
