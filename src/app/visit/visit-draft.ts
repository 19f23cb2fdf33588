import type { Visit } from '../core/wire';
import { codeProblem } from '../shared/trouble-code-words';
import { vinVerdict } from './vin-words';

/** A visit as it is being typed: all text, nothing lost. */
export interface VisitDraft {
  readonly vin: string;
  readonly isVinKept: boolean;
  readonly repairOrder: string;
  readonly odometer: string;
  readonly odometerUnit: 'km' | 'mi';
  readonly concern: string;
  readonly codes: readonly string[];
  /** What stands in the codes' field and was not added yet. */
  readonly codesTyped: string;
  readonly make: string;
  readonly model: string;
  readonly colour: string;
  readonly engine: string;
  readonly displacementL: string;
  readonly year: string;
}

/** Field -> what is wrong with it, in words. */
export type DraftProblems = Partial<Record<keyof VisitDraft, string>>;

export const emptyDraft: VisitDraft = {
  vin: '',
  isVinKept: false,
  repairOrder: '',
  odometer: '',
  odometerUnit: 'km',
  concern: '',
  codes: [],
  codesTyped: '',
  make: '',
  model: '',
  colour: '',
  engine: '',
  displacementL: '',
  year: '',
};

/** What the server takes, for both. */
const mostOdometerDigits = 7;
const firstCarYear = 1886;

/** What must be mended before the visit can be kept. */
export function draftProblems(draft: VisitDraft, thisYear: number): DraftProblems {
  const problems: Partial<Record<keyof VisitDraft, string | undefined>> = {
    vin: vinProblem(draft, thisYear),
    repairOrder: lengthProblem(draft.repairOrder, 40, 'Type the number of the repair order.'),
    odometer: odometerProblem(draft.odometer),
    concern: lengthProblem(draft.concern, 4000, "Type the customer's concern in a few words."),
    codes: draft.codes.map(codeProblem).find((problem) => problem !== undefined),
    make: lengthProblem(draft.make, 100, 'Type the make.'),
    model: lengthProblem(draft.model, 100, 'Type the model.'),
    displacementL: displacementProblem(draft.displacementL),
    year: yearProblem(draft.year, thisYear),
  };
  return Object.fromEntries(Object.entries(problems).filter(([, problem]) => problem !== undefined));
}

/** What a visit holds besides what is typed. */
export interface VisitOrigin {
  readonly id: string;
  readonly siteId: string;
  readonly openedBy: string;
  readonly openedAt: number;
  readonly changedAt: number;
}

/** The visit that a draft without problems makes. */
export function visitOf(draft: VisitDraft, origin: VisitOrigin, thisYear: number): Visit {
  const isOdd = vinVerdict(draft.vin, thisYear).is === 'second-look';
  const displacement = tidyDisplacement(draft.displacementL);
  return {
    ...origin,
    vin: draft.vin,
    ...(isOdd && draft.isVinKept ? { vinKept: 'after a second look' as const } : {}),
    repairOrder: tidyText(draft.repairOrder),
    odometer: { text: tidyOdometer(draft.odometer), unit: draft.odometerUnit },
    concern: draft.concern.trim(),
    codes: draft.codes,
    car: {
      make: tidyText(draft.make),
      model: tidyText(draft.model),
      ...optional('colour', tidyText(draft.colour)),
      ...optional('engine', tidyText(draft.engine)),
      ...optional('displacementL', displacement),
      ...(draft.year.trim() === '' ? {} : { year: Number(draft.year.trim()) }),
    },
  };
}

/** A kept visit, to be changed. */
export function draftOf(visit: Visit): VisitDraft {
  const { car } = visit;
  return {
    vin: visit.vin,
    isVinKept: visit.vinKept !== undefined,
    repairOrder: visit.repairOrder,
    odometer: visit.odometer.text,
    odometerUnit: visit.odometer.unit,
    concern: visit.concern,
    codes: visit.codes,
    codesTyped: '',
    make: car.make,
    model: car.model,
    colour: car.colour ?? '',
    engine: car.engine ?? '',
    displacementL: car.displacementL ?? '',
    year: car.year === undefined ? '' : String(car.year),
  };
}

function vinProblem({ vin, isVinKept }: VisitDraft, thisYear: number): string | undefined {
  const verdict = vinVerdict(vin, thisYear);
  switch (verdict.is) {
    case 'empty':
      return 'Type the VIN.';
    case 'short':
      return `A VIN has 17 characters: ${verdict.words}.`;
    case 'wrong':
      return verdict.words;
    case 'second-look':
      return isVinKept ? undefined : 'Look again, or keep it as it is.';
    case 'fits':
      return undefined;
  }
}

function lengthProblem(text: string, most: number, whenEmpty: string): string | undefined {
  const length = text.trim().length;
  if (length === 0) return whenEmpty;
  return length > most ? `Use at most ${most} characters.` : undefined;
}

function odometerProblem(text: string): string | undefined {
  const tidy = tidyOdometer(text);
  if (tidy === '') return 'Type what the odometer shows.';
  if (!/^\d+$/.test(tidy)) return 'Type whole digits, as the odometer shows them.';
  return tidy.length > mostOdometerDigits ? `Type at most ${mostOdometerDigits} digits.` : undefined;
}

function displacementProblem(text: string): string | undefined {
  const tidy = tidyDisplacement(text);
  return tidy === '' || /^\d{1,2}(\.\d{1,3})?$/.test(tidy) ? undefined : 'Type litres, such as 1.6.';
}

function yearProblem(text: string, thisYear: number): string | undefined {
  const tidy = text.trim();
  if (tidy === '') return undefined;
  const year = /^\d{4}$/.test(tidy) ? Number(tidy) : 0;
  const last = thisYear + 1;
  return year >= firstCarYear && year <= last ? undefined : `Type a year from ${firstCarYear} to ${last}.`;
}

/** Thousands may be set apart by blanks, commas or apostrophes. */
const tidyOdometer = (text: string): string => text.replace(/[\s,'\u2019]/g, '');
const tidyDisplacement = (text: string): string => text.trim().replace(',', '.').replace(/\s*l$/i, '');
const tidyText = (text: string): string => text.trim().replace(/\s+/g, ' ');

function optional<K extends string>(key: K, text: string): Partial<Record<K, string>> {
  return text === '' ? {} : ({ [key]: text } as Partial<Record<K, string>>);
}
