import { differenceFromBase, differenceToBase, expandedUncertainty, unitKind } from '../../calculations/for-a-run';
import type { GearNeed } from '../procedure-document';
import { bandedQuantities, type BandedQuantity } from './banded-quantities';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { NominalFigures, shortFigure } from './nominal-figures';

/** The part of a band that has to be left for a clear "in": our own choice, no source. */
const leastClearPart = 0.5;

/**
 * Bands too narrow for the steps of the named gear. A display of step d alone leaves U = 2 d / (2 sqrt 3) (JCGM 100,
 * F.2.2.1), and on both sides of each end of the band a reading within U is too close to call.
 */
export function narrowBands(subject: LintSubject): readonly LintFinding[] {
  const figures = new NominalFigures(subject.document);
  return bandedQuantities(subject.document).flatMap((banded) => {
    const need = subject.document.gear.find(({ role }) => role === banded.gear);
    const width = widthOf(banded, subject, figures);
    const finding = need === undefined || width === undefined ? undefined : tooNarrow(banded, need, width);
    return finding === undefined ? [] : [finding];
  });
}

function widthOf({ band }: BandedQuantity, { trees }: LintSubject, figures: NominalFigures): number | undefined {
  const low = band.low === undefined ? undefined : trees.get(band.low);
  const high = band.high === undefined ? undefined : trees.get(band.high);
  if (low === undefined || high === undefined) return undefined;
  return figures.constantValue([low, high], ([from, to]) => (to ?? Number.NaN) - (from ?? Number.NaN));
}

function tooNarrow(
  { step, quantity, pointer }: BandedQuantity,
  { label, shows }: GearNeed,
  widthBase: number,
): LintFinding | undefined {
  const { unit, name } = quantity;
  if (shows === undefined || unitKind(shows.unit) !== unitKind(unit)) return undefined;
  const width = differenceFromBase(widthBase, unit);
  const resolution = differenceFromBase(differenceToBase(shows.resolution, shows.unit), unit);
  const uncertainty = expandedUncertainty({ resolution });
  if (width - 2 * uncertainty >= leastClearPart * width) return undefined;
  const [wide, steps, each, both] = [width, resolution, uncertainty, 2 * uncertainty].map(shortFigure);
  const left =
    width > 2 * uncertainty
      ? `only ${shortFigure(width - 2 * uncertainty)} ${unit} of it can be called in band`
      : 'nothing can ever be called in band';
  const message = `${stepWords(step)}: the band of ${name} is ${wide} ${unit} wide, and ${label} shows steps of ${steps} ${unit}, so U is at least ${each} ${unit}; with ${both} ${unit} (2 U) too close to call, ${left}. Name finer gear or a wider band.`;
  return { rule: 'band-and-gear', step: step.id, pointer, message };
}
