import { fromBase, toBase, unitKind } from '../../calculations/for-a-run';
import { expressionPlaces, type ExpressionPlace } from '../expression-places';
import type { ComparisonNode, Expression } from '../expression/expression';
import { partsOf } from '../expression/names-in';
import type { GearNeed, ProcedureDocument, Step } from '../procedure-document';
import { channelsOf } from '../step-parts';
import { bandedQuantities, shownQuantities } from './banded-quantities';
import { ceilingOf } from './ceilings';
import { decimalsIn, decimalsOfStep } from './figures-in-text';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { NominalFigures, shortFigure } from './nominal-figures';

type Shows = NonNullable<GearNeed['shows']>;

/** A figure that a reading is held against, and the gear that shows the reading. */
interface Held {
  /** `the high end of the band of sealPoint`. */
  readonly what: string;
  readonly step?: Step;
  readonly pointer: string;
  /** The text in which the expression stands: its figures' digits are read off it. */
  readonly source: string;
  readonly figure: Expression;
  readonly gear: GearNeed;
  /** Added before it is held against the gear's range, in base units: the air of the place, for an absolute reading. */
  readonly offset?: number;
}

/** Sea level of the standard atmosphere, Pa (ISO 2533:1975): most air that a gauge pressure can stand on. */
const seaLevelPa = 101_325;

/** Figures with more digits than the named gear shows, or outside of its range: nobody can read whether they are met. */
export function limitsBeyondGear(subject: LintSubject): readonly LintFinding[] {
  const figures = new NominalFigures(subject.document);
  const held = [...bandEnds(subject), ...comparedFigures(subject), ...ceilings(subject, figures)];
  return held.flatMap((one) => [...tooManyDigits(one, subject.document), ...outOfRange(one, figures)]);
}

function bandEnds({ document, trees }: LintSubject): readonly Held[] {
  return bandedQuantities(document).flatMap(({ step, quantity, band, gear, pointer }) => {
    const need = gearShowing(document, gear, quantity.unit);
    if (need === undefined) return [];
    return (['low', 'high'] as const).flatMap((end): Held[] => {
      const source = band[end];
      const figure = source === undefined ? undefined : trees.get(source);
      if (source === undefined || figure === undefined) return [];
      const what = `the ${end} end of the band of ${quantity.name}`;
      return [{ what, step, pointer: `${pointer}/${end}`, source, figure, gear: need }];
    });
  });
}

/** Readings that a condition compares with a figure: `gaugeLeft <= 0.2 kPa`. */
function comparedFigures({ document, trees }: LintSubject): readonly Held[] {
  const shown = new Map(shownQuantities(document).map(({ quantity, gear }) => [quantity.name, { quantity, gear }]));
  const steps = new Map(document.steps.map((step) => [step.id, step]));
  return expressionPlaces(document).flatMap((place) => {
    const tree = trees.get(place.source);
    if (tree === undefined || place.sees === 'gauge' || place.gives.is !== 'truth') return [];
    return comparisonsIn(tree).flatMap(({ left, right }) =>
      [
        [left, right],
        [right, left],
      ].flatMap(([name, figure]): readonly Held[] => {
        const known = name?.node === 'name' ? shown.get(name.name) : undefined;
        const gear = known === undefined ? undefined : gearShowing(document, known.gear, known.quantity.unit);
        if (known === undefined || gear === undefined || figure === undefined) return [];
        const step = place.step === undefined ? undefined : steps.get(place.step);
        const what = `${place.where}: the figure for ${known.quantity.name}`;
        return [{ what, ...(step === undefined ? {} : { step }), ...placed(place), figure, gear }];
      }),
    );
  });
}

const placed = ({ pointer, source }: ExpressionPlace): Pick<Held, 'pointer' | 'source'> => ({ pointer, source });

function comparisonsIn(node: Expression): readonly ComparisonNode[] {
  return node.node === 'comparison' ? [node] : partsOf(node).flatMap(comparisonsIn);
}

/** The ceiling of a limit, for the gear of each channel and reading that is held against it. */
function ceilings({ document, trees }: LintSubject, figures: NominalFigures): readonly Held[] {
  const shown = shownQuantities(document).map(({ quantity: { name, unit, sense }, gear }) => ({
    name,
    unit,
    sense,
    gear,
  }));
  return document.limits.flatMap((limit, place) => {
    const ceiling = ceilingOf(limit, trees, figures);
    if (ceiling === undefined) return [];
    const held = [...document.steps.flatMap(channelsOf), ...shown].filter(({ name }) => limit.of.includes(name));
    const roles = new Map<string, { readonly gear: GearNeed; readonly offset: number }>();
    for (const { gear: role, unit, sense } of held) {
      const gear = unit === 'dB' ? undefined : gearShowing(document, role, unit);
      if (gear !== undefined) roles.set(`${role} ${sense}`, { gear, offset: sense === 'absolute' ? seaLevelPa : 0 });
    }
    return [...roles.values()].map(({ gear, offset }): Held => {
      const at = { pointer: `/limits/${place}/holds`, source: limit.holds };
      return { what: `limit ${limit.id}`, ...at, figure: ceiling.figure, gear, offset };
    });
  });
}

/** The gear of a role, where it shows what the unit measures. */
function gearShowing(document: ProcedureDocument, role: string | undefined, unit: Shows['unit']): GearNeed | undefined {
  const need = document.gear.find((candidate) => candidate.role === role);
  return need?.shows !== undefined && unitKind(need.shows.unit) === unitKind(unit) ? need : undefined;
}

/** The last digit of a figure, as it is written or as an input gives it, against the last one that the gear shows. */
function tooManyDigits({ figure, source, gear, ...held }: Held, { inputs }: ProcedureDocument): readonly LintFinding[] {
  const { shows } = gear;
  if (shows === undefined) return [];
  const written = leavesOf(figure).flatMap((leaf): { readonly text: string; readonly unit: Shows['unit'] }[] => {
    if (leaf.node === 'number') return [{ text: source.slice(leaf.start, leaf.end), unit: leaf.unit }];
    const input = leaf.node === 'name' ? inputs.find(({ name }) => name === leaf.name) : undefined;
    return input?.default === undefined ? [] : [{ text: `${input.default} ${input.unit}`, unit: input.unit }];
  });
  const finest = lastDigit(decimalsOfStep(shows.resolution), shows.unit);
  return written.flatMap(({ text, unit }): LintFinding[] => {
    // In another unit the digits cannot be compared one by one.
    if (unit !== shows.unit) return [];
    if (lastDigit(decimalsIn(text), unit) > finest * 0.999) return [];
    const message = `${placeWords(held)}: ${text} has more digits than ${gear.label} shows, steps of ${shows.resolution} ${shows.unit}. Round it to ${decimalsOfStep(shows.resolution)} decimals, or name finer gear.`;
    return [found(held, message)];
  });
}

function lastDigit(decimals: number, unit: Shows['unit']): number {
  return toBase(10 ** -decimals, unit) - toBase(0, unit);
}

function leavesOf(node: Expression): readonly Expression[] {
  const parts = partsOf(node);
  return parts.length === 0 ? [node] : parts.flatMap(leavesOf);
}

function outOfRange({ figure, gear, offset = 0, ...held }: Held, figures: NominalFigures): readonly LintFinding[] {
  const { shows } = gear;
  const value = figures.constantValue([figure], ([one]) => one ?? Number.NaN);
  if (shows === undefined || value === undefined) return [];
  const [low, high] = [toBase(shows.low, shows.unit), toBase(shows.high, shows.unit)];
  const slack = 1e-9 * Math.max(Math.abs(low), Math.abs(high));
  if (value + offset >= low - slack && value + offset <= high + slack) return [];
  const shown = shortFigure(fromBase(value + offset, shows.unit));
  const air = offset === 0 ? '' : ', the air at sea level with it,';
  const message = `${placeWords(held)}: ${shown} ${shows.unit}${air} lies outside of what ${gear.label} shows, ${shows.low} to ${shows.high} ${shows.unit}. Name gear that reaches it.`;
  return [found(held, message)];
}

function placeWords({ step, what }: Pick<Held, 'step' | 'what'>): string {
  const words = step === undefined ? what : `${stepWords(step)}, ${what}`;
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function found({ step, pointer }: Pick<Held, 'step' | 'pointer'>, message: string): LintFinding {
  return { rule: 'limit-and-gear', ...(step === undefined ? {} : { step: step.id }), pointer, message };
}
