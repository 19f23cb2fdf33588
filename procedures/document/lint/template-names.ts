import { declarationsOf } from '../declarations';
import type { Step } from '../procedure-document';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import { askedFor, namesInTemplate, visitNames } from './named-values';
import { waysOf } from './ways';

/** Templates that name what no part of the procedure gives, so that the braces would stand in the text. */
export function unknownTemplateNames({ document }: LintSubject): readonly LintFinding[] {
  const known = new Set([
    ...visitNames,
    ...[...declarationsOf(document).declarations.values()].flatMap(({ kind, name }) =>
      kind === 'quantity' ? name : [],
    ),
    ...document.steps.flatMap(askedFor),
    // A step's id stands for its title; a truth has no words.
    ...document.steps.map(({ id }) => id),
  ]);
  return document.steps.flatMap((step, place) =>
    templatesOf(step)
      .concat(
        waysOf(document, place)
          .filter(({ kind }) => kind !== 'stop')
          .map(({ exit }) => exit.because),
      )
      .flatMap(namesInTemplate)
      .filter((name, index, all) => !known.has(name) && all.indexOf(name) === index)
      .map((name): LintFinding => {
        const message = `${stepWords(step)}: the text names {${name}}, and nothing in the procedure is called that.`;
        return { rule: 'references', step: step.id, pointer: `/steps/${place}`, message };
      }),
  );
}

function templatesOf(step: Step): readonly string[] {
  const why = step.why === undefined ? [] : [step.why];
  if (step.kind !== 'finding') return why;
  const sentences = [...step.cause, ...step.correction, ...step.customer].map(({ text }) => text);
  return [...why, step.verdict, ...sentences];
}
