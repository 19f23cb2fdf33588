import type { Band, EntryWay, ProcedureDocument, Quantity, ReadQuantity, Sentence, Step } from './procedure-document';
import { findsOf, isFoundQuantity, placedReadsOf, takenOf } from './step-parts';

/** An expression of a document: where it stands, and what it has to give there. */
export interface ExpressionPlace {
  readonly source: string;
  /** JSON pointer (RFC 6901) into the document. */
  readonly pointer: string;
  readonly step?: string;
  /** `branch 2`, `lower end of the band of manifoldPressure`: for messages. */
  readonly where: string;
  readonly gives:
    | { readonly is: 'truth' }
    /** A value of the quantity, an end of its band, or an uncertainty of it. */
    | { readonly is: 'value' | 'uncertainty'; readonly of: Pick<Quantity, 'unit' | 'sense'> };
  /** Limits see the one name `gauge`; everything else sees the run. */
  readonly sees: 'run' | 'gauge';
}

const truth = { is: 'truth' } as const;

/** Every expression of a document, in its order. */
export function expressionPlaces(document: ProcedureDocument): readonly ExpressionPlace[] {
  const limits = document.limits.map((limit, index): ExpressionPlace => ({
    source: limit.holds,
    pointer: `/limits/${index}/holds`,
    where: `limit ${limit.id}`,
    gives: truth,
    sees: 'gauge',
  }));
  return [...limits, ...document.steps.flatMap((step, index) => stepPlaces(step, `/steps/${index}`))];
}

type Place = Omit<ExpressionPlace, 'step' | 'sees'>;

function stepPlaces(step: Step, pointer: string): readonly ExpressionPlace[] {
  const places = step.kind === 'finding' ? [] : [...resultPlaces(step, pointer), ...branchPlaces(step, pointer)];
  return [...ownPlaces(step, pointer), ...places].map((place) => ({ ...place, step: step.id, sees: 'run' }));
}

function ownPlaces(step: Step, pointer: string): readonly Place[] {
  const quantities = [
    ...placedReadsOf(step).flatMap(({ part, pointer: place }) => readPlaces(part, `${pointer}/${place}`)),
    ...findsOf(step).flatMap((found, index) =>
      isFoundQuantity(found) ? bandPlaces(found, `${pointer}/finds/${index}`) : [],
    ),
    ...takenOf(step).flatMap((taken, index) => bandPlaces(taken, `${pointer}/takes/${index}`)),
  ];
  switch (step.kind) {
    case 'wait':
      return [
        ...quantities,
        { source: step.until, pointer: `${pointer}/until`, where: 'what is waited for', gives: truth },
      ];
    case 'finding':
      return (['cause', 'correction', 'customer'] as const).flatMap((part) =>
        sentencePlaces(step[part], `${pointer}/${part}`, part),
      );
    default:
      return quantities;
  }
}

function readPlaces(quantity: ReadQuantity, pointer: string): readonly Place[] {
  return [
    ...(quantity.ways ?? []).flatMap((way, place) => wayPlaces(way, quantity, `${pointer}/ways/${place}`)),
    ...bandPlaces(quantity, pointer),
  ];
}

function wayPlaces(way: EntryWay, of: Quantity, pointer: string): readonly Place[] {
  const where = `way ${way.id} of ${of.name}`;
  const value: Place = { source: way.is, pointer: `${pointer}/is`, where, gives: { is: 'value', of } };
  if (way.uncertainty === undefined) return [value];
  const gives = { is: 'uncertainty', of } as const;
  return [
    value,
    { source: way.uncertainty, pointer: `${pointer}/uncertainty`, where: `uncertainty of the ${where}`, gives },
  ];
}

function bandPlaces(of: Quantity, quantityPointer: string): readonly Place[] {
  const band: Band | undefined = of.band;
  if (band === undefined) return [];
  const pointer = `${quantityPointer}/band`;
  const gives = { is: 'value', of } as const;
  const name = `the band of ${of.name}`;
  return [
    ...(band.low === undefined
      ? []
      : [{ source: band.low, pointer: `${pointer}/low`, where: `lower end of ${name}`, gives }]),
    ...(band.high === undefined
      ? []
      : [{ source: band.high, pointer: `${pointer}/high`, where: `upper end of ${name}`, gives }]),
    ...(band.when === undefined
      ? []
      : [{ source: band.when, pointer: `${pointer}/when`, where: `condition of ${name}`, gives: truth }]),
  ];
}

function resultPlaces(step: Exclude<Step, { kind: 'finding' }>, pointer: string): readonly Place[] {
  return (step.results ?? []).flatMap((result, index): Place[] => {
    const at = `${pointer}/results/${index}`;
    const value: Place = {
      source: result.is,
      pointer: `${at}/is`,
      where: `result ${result.name}`,
      gives: { is: 'value', of: result },
    };
    return [value, ...bandPlaces(result, at)];
  });
}

function branchPlaces(step: Exclude<Step, { kind: 'finding' }>, pointer: string): readonly Place[] {
  return (step.next ?? []).map((branch, index) => ({
    source: branch.when,
    pointer: `${pointer}/next/${index}/when`,
    where: `branch ${index + 1}`,
    gives: truth,
  }));
}

function sentencePlaces(sentences: readonly Sentence[], pointer: string, part: string): readonly Place[] {
  return sentences.flatMap(({ when }, index) =>
    when === undefined
      ? []
      : [{ source: when, pointer: `${pointer}/${index}/when`, where: `${part}, sentence ${index + 1}`, gives: truth }],
  );
}
