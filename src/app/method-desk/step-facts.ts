import type { ProcedureDocument, ReadQuantity, Step } from '../../../procedures/document';

/** What an author says of a step beside its sentence, its quantities and its ways, for reading. */
export interface StepFact {
  readonly title: string;
  readonly lines: readonly string[];
}

/** Everything that a step asks of people and time, each under a title; what it does not have is left out. */
export function factsOf(document: ProcedureDocument, step: Step): readonly StepFact[] {
  const { short, notes = [], stay, release, verify } = step;
  return [
    fact('In few words', short === undefined ? [] : [short]),
    fact('Notes, folded at the car', notes),
    fact('Stays at the car', stay === true ? ['Nothing that can wait is said while this step is open.'] : []),
    fact(
      verify?.how === 'concurrent' ? 'A second person looks, beside the first' : 'A second person looks, by themselves',
      verify === undefined ? [] : [verify.what],
    ),
    fact(`Released by the ${release?.by ?? 'lead'}, on this evidence`, release === undefined ? [] : [release.evidence]),
    ...ofKind(step),
    fact(
      'How long its readings hold',
      readsOf(step).flatMap((read) => validityWords(document, read)),
    ),
  ].filter(({ lines }) => lines.length > 0);
}

function ofKind(step: Step): readonly StepFact[] {
  switch (step.kind) {
    case 'photo':
      return [fact('The photo must show', step.shows)];
    case 'hold':
      return [fact('Lasts', [`${step.seconds} s`])];
    case 'wait':
      return [fact('Lasts at least', step.atLeastSeconds === undefined ? [] : [`${step.atLeastSeconds} s`])];
    case 'call':
      return [
        fact('Calls', [`${step.procedure}, version ${step.version}`]),
        fact(
          'Its findings are asked for as',
          step.finds.map(({ finding, name }) => `${finding}: ${name}`),
        ),
      ];
    default:
      return [];
  }
}

function readsOf(step: Step): readonly ReadQuantity[] {
  if (step.kind === 'reading' || step.kind === 'wait') return step.reads;
  return step.kind === 'hold' ? [...(step.begins ?? []), ...(step.ends ?? [])] : [];
}

function validityWords({ steps }: ProcedureDocument, { label, validity }: ReadQuantity): readonly string[] {
  if (validity === undefined) return [];
  const { minutes, until = [], because } = validity;
  const numbers = until.map((id) => steps.find((step) => step.id === id)?.number ?? id);
  const ends = [
    minutes === undefined ? undefined : `for ${minutes} min`,
    numbers.length === 0 ? undefined : `until step ${numbers.join(' or ')} is done`,
  ].filter((end) => end !== undefined);
  return [`${label}: ${ends.join(', and at most ')}. ${because}`];
}

const fact = (title: string, lines: readonly string[]): StepFact => ({ title, lines });
