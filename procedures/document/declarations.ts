import type { UnitName } from '../calculations/for-a-run';
import { declaredKind, truth, type Kind } from './expression/kinds';
import { isCalculation, isQuestion } from './expression/vocabulary';
import type { PressureSense, ProcedureDocument, Quantity, Step } from './procedure-document';
import { findsOf, isFoundQuantity, readsOf, resultsOf, takenOf } from './step-parts';

/** What a name of a document stands for. */
export type Declaration =
  | {
      readonly kind: 'truth';
      readonly name: string;
      readonly label: string;
      readonly step?: string;
      /** Whether it is a finding: true while the run heads for it. */
      readonly isFinding?: boolean;
    }
  | {
      readonly kind: 'quantity';
      readonly name: string;
      readonly label: string;
      readonly unit: UnitName;
      readonly sense?: PressureSense;
      /** Whether it can have a band, so that it can be in or out of it. */
      readonly hasBand: boolean;
      /** The step that gives it a value; absent for an input. */
      readonly step?: string;
    };

export interface DeclarationProblem {
  readonly step?: string;
  readonly where: string;
  readonly message: string;
}

/** Every name that expressions may use, and what is wrong with them. A name may be given a value by several steps. */
export function declarationsOf(document: ProcedureDocument): {
  readonly declarations: ReadonlyMap<string, Declaration>;
  readonly problems: readonly DeclarationProblem[];
} {
  const declarations = new Map<string, Declaration>();
  const problems: DeclarationProblem[] = [];
  for (const declared of allDeclarations(document)) {
    const place = declared.step === undefined ? {} : { step: declared.step };
    const before = declarations.get(declared.name);
    if (!isFree(declared.name)) {
      const message = `\`${declared.name}\` is a word of the expression language: choose another name.`;
      problems.push({ ...place, where: `name ${declared.name}`, message });
    } else if (before !== undefined && !isSameMeaning(before, declared)) {
      const message = `\`${declared.name}\` already stands for something else${before.step === undefined ? '' : ` (step ${before.step})`}: give one of them another name.`;
      problems.push({ ...place, where: `name ${declared.name}`, message });
    } else {
      declarations.set(declared.name, before === undefined ? declared : merged(before, declared));
    }
  }
  return { declarations, problems };
}

export function kindOfDeclaration(declared: Declaration): Kind {
  return declared.kind === 'truth' ? truth : declaredKind(declared.unit, declared.sense);
}

function allDeclarations(document: ProcedureDocument): readonly Declaration[] {
  const inputs = document.inputs.map((input) => quantity(input));
  const halves =
    document.pair === true ? [truthNamed('cold', 'the cold half'), truthNamed('warm', 'the warm half')] : [];
  return [...inputs, ...halves, ...document.steps.flatMap(stepDeclarations)];
}

function stepDeclarations(step: Step): readonly Declaration[] {
  return [
    ...readsOf(step).flatMap((read) => [
      quantity(read, step.id),
      ...(read.ways ?? []).flatMap(({ entry }) => (entry === undefined ? [] : [quantity(entry, step.id)])),
    ]),
    ...findsOf(step).map((found) =>
      isFoundQuantity(found) ? quantity(found, step.id) : truthNamed(found.name, found.what, step.id),
    ),
    ...takenOf(step).map((taken) => quantity(taken, step.id)),
    ...ownTruths(step),
    ...resultsOf(step).map((result) => quantity(result, step.id)),
  ];
}

function ownTruths(step: Step): readonly Declaration[] {
  switch (step.kind) {
    case 'choice':
      return step.options.map(({ name, label }) => truthNamed(name, label, step.id));
    case 'drive':
      return step.windows.map(({ name, label }) => truthNamed(name, label, step.id));
    case 'codes':
      return step.newCodes === undefined ? [] : [truthNamed(step.newCodes, 'a new trouble code', step.id)];
    case 'call':
      return step.finds.map(({ name, finding }) => truthNamed(name, `${step.title}: ${finding}`, step.id));
    case 'finding':
      return [{ ...truthNamed(step.id, step.title, step.id), isFinding: true }];
    default:
      return [];
  }
}

function quantity(declared: Pick<Quantity, 'name' | 'label' | 'unit' | 'sense' | 'band'>, step?: string): Declaration {
  const { name, label, unit, sense, band } = declared;
  return {
    kind: 'quantity',
    name,
    label,
    unit,
    hasBand: band !== undefined,
    ...(sense === undefined ? {} : { sense }),
    ...(step === undefined ? {} : { step }),
  };
}

function truthNamed(name: string, label: string, step?: string): Extract<Declaration, { kind: 'truth' }> {
  return { kind: 'truth', name, label, ...(step === undefined ? {} : { step }) };
}

/** `stationPressure` and `gauge` are functions only before a bracket, so both are free as names. */
function isFree(name: string): boolean {
  return name === 'stationPressure' || name === 'gauge' || !(isCalculation(name) || isQuestion(name) || isWord(name));
}

function isWord(name: string): boolean {
  return ['and', 'or', 'not', 'true', 'false', 'null', 'undefined', 'mod', 'xor', 'to', 'in', 'verdict'].includes(name);
}

function isSameMeaning(a: Declaration, b: Declaration): boolean {
  // A finding's truth follows the verdict, so nothing else may set it.
  if (a.kind === 'truth' && b.kind === 'truth') return a.isFinding !== true && b.isFinding !== true;
  if (a.kind === 'truth' || b.kind === 'truth') return false;
  return a.unit === b.unit && a.sense === b.sense;
}

function merged(before: Declaration, declared: Declaration): Declaration {
  if (before.kind === 'truth' || declared.kind === 'truth') return before;
  return { ...before, hasBand: before.hasBand || declared.hasBand };
}
