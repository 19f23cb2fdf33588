import type { Caution } from '../procedure-document';
import { imperativesIn, isConditional, sentencesOf, type Imperative } from './imperatives';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** Verbs by which work of the procedure is recognised: what is recorded, taken apart, or gone on with. */
const workVerbs: ReadonlySet<string> = new Set(
  `adjust calibrate connect continue disconnect enter fit go install log measure note photograph proceed read record
  reconnect refit reinstall repeat replace torque unplug write`.split(/\s+/),
);
/** What a person takes off or leaves out for their own sake. */
const ownSake = /\b(?:jewellery|rings?|watch|scarf|sleeves?|ties?|hair|gloves?|goggles|outside|away)\b/i;

/**
 * Cautions that hold work: whoever skips the caution skips the work. How to avoid the harm is a caution's own ("keep
 * clear", "stop when ..."), and so is an act under a condition.
 */
export function cautionsWithWork({ document }: LintSubject): readonly LintFinding[] {
  const acts = actsOf(document.steps);
  const throughout = document.start.throughout.flatMap((caution, index) =>
    findings(caution, 'The start card', { pointer: `/start/throughout/${index}` }, acts),
  );
  const steps = document.steps.flatMap((step, place) =>
    (step.cautions ?? []).flatMap((caution, index) => {
      const at = { step: step.id, pointer: `/steps/${place}/cautions/${index}` };
      return findings(caution, stepWords(step), at, acts);
    }),
  );
  return [...throughout, ...steps];
}

/** Notes that ask for something to be done: notes are read by nobody in a hurry. */
export function notesWithImperatives({ document }: LintSubject): readonly LintFinding[] {
  return document.steps.flatMap((step, place) =>
    (step.notes ?? []).flatMap((note, index): LintFinding[] => {
      const [first] = sentencesOf(note).flatMap(imperativesIn);
      if (first === undefined) return [];
      const message = `${stepWords(step)}: note ${index + 1} asks for something to be done, "${first.words}". Make it a step, or say only what is so.`;
      return [{ rule: 'note-work', step: step.id, pointer: `/steps/${place}/notes/${index}`, message }];
    }),
  );
}

/** The acts of the steps as `verb object`: what stands in an action is the procedure's work, wherever it is said. */
function actsOf(steps: LintSubject['document']['steps']): ReadonlySet<string> {
  return new Set(
    steps.filter(({ kind }) => kind !== 'finding').flatMap(({ action }) => imperativesIn(action).map(actOf)),
  );
}

/** The verb and the noun that it is about: `pull dipstick`. */
function actOf({ verb, words }: Imperative): string {
  const [, ...rest] = words.toLowerCase().split(/[^a-z{}-]+/);
  return `${verb} ${rest.find((word) => !/^(?:the|a|an|its|your|all|each|every|of)$/.test(word)) ?? ''}`;
}

function findings(
  { word, text }: Caution,
  where: string,
  at: Pick<LintFinding, 'step' | 'pointer'>,
  acts: ReadonlySet<string>,
): readonly LintFinding[] {
  const work = sentencesOf(text)
    .filter((sentence) => !/^(?:do not|don['\u2019]t|never)\b/i.test(sentence))
    .flatMap((sentence) =>
      imperativesIn(sentence).filter((imperative) => isWork(imperative, isConditional(sentence), acts)),
    )[0];
  if (work === undefined) return [];
  const message = `${where}: the ${word} holds work of the procedure, "${work.words}". Make that a step; a ${word} says the hazard, the harm and how to avoid it.`;
  return [{ rule: 'caution-work', ...at, message }];
}

function isWork(imperative: Imperative, isUnderCondition: boolean, acts: ReadonlySet<string>): boolean {
  if (ownSake.test(imperative.words)) return false;
  if (workVerbs.has(imperative.verb)) return true;
  return !isUnderCondition && acts.has(actOf(imperative));
}
