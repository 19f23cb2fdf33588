import type { ProcedureDocument, Step } from '../procedure-document';
import { documentTexts, textPlace } from './document-texts';
import { imperativesIn } from './imperatives';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';
import type { RunGraph, RunPlace } from './run-graph';

/** What is read with the action or after it: a hazard that is told here is told too late. */
const afterTheAction: readonly string[] = ['action', 'short', 'why', 'because', 'meanwhile', 'notes', 'hint', 'ask'];
const signal =
  /(?:^|[.;:!?]\s+)((?:danger|warning|caution|attention|beware|careful|be careful|take care|watch out)\b(?!\s+(?:lamp|light|label|sign|triangle)))/i;

/** Cautions that come after the act that they warn of: in the action's own texts, or on a later step. */
export function lateCautions(subject: LintSubject): readonly LintFinding[] {
  return [...inOtherTexts(subject.document), ...onLaterSteps(subject)];
}

function inOtherTexts(document: ProcedureDocument): readonly LintFinding[] {
  return documentTexts(document)
    .filter(({ field, step }) => step !== undefined && afterTheAction.includes(field))
    .flatMap((placed): LintFinding[] => {
      const word = signal.exec(placed.text)?.[1];
      if (word === undefined) return [];
      const message = `${textPlace(document, placed)}: "${word}" stands in \`${placed.field}\`, which is read with the action or after it. Move it into \`cautions\`, which are shown before.`;
      return [
        {
          rule: 'caution-place',
          ...(placed.step === undefined ? {} : { step: placed.step }),
          pointer: placed.pointer,
          message,
        },
      ];
    });
}

interface Act {
  readonly step: Step;
  readonly noun: string;
  /** What speaks to whoever is about to do this. */
  readonly pattern: RegExp;
}

/** Cautions that say "before opening the cap" where every way has passed the step that opens it. */
function onLaterSteps({ document, graphs }: LintSubject): readonly LintFinding[] {
  const acts = actsByNoun(document.steps);
  return document.steps.flatMap((step, place) =>
    (step.cautions ?? []).flatMap(({ word, text }, index): LintFinding[] => {
      const nouns = new Set(text.toLowerCase().split(/[^a-z-]+/));
      const meant = [...nouns].flatMap((noun) => acts.get(noun) ?? []).filter(({ pattern }) => pattern.test(text));
      if (meant.length === 0 || meant.some((act) => act.step === step || canFollow(act.step, step, graphs))) return [];
      const [first] = meant.filter((act) => canFollow(step, act.step, graphs));
      if (first === undefined) return [];
      const message = `${stepWords(step)}: the ${word} warns of what step ${first.step.number} does ("${first.step.action}"), and comes after it. Put it on step ${first.step.number}.`;
      return [{ rule: 'caution-place', step: step.id, pointer: `/steps/${place}/cautions/${index}`, message }];
    }),
  );
}

/** Few acts are about one thing, so that a caution is held against those alone. */
function actsByNoun(steps: readonly Step[]): ReadonlyMap<string, readonly Act[]> {
  const acts = new Map<string, Act[]>();
  for (const act of steps.flatMap(actOf)) acts.set(act.noun, [...(acts.get(act.noun) ?? []), act]);
  return acts;
}

function actOf(step: Step): readonly Act[] {
  if (step.kind === 'finding') return [];
  const [first] = imperativesIn(step.action);
  if (first === undefined) return [];
  const noun = first.words
    .toLowerCase()
    .split(/[^a-z-]+/)
    .slice(1)
    .find((word) => word.length > 3 && !/^(?:every|each|your|from|with|into|over|down|slowly)$/.test(word));
  if (noun === undefined) return [];
  const stem = first.verb.replace(/e$/, '');
  const doubled = `${stem}${stem.slice(-1)}?`;
  const gerund = `${doubled}ing`;
  const before = `(?:before|when|while)\\s+(?:you\\s+(?:start\\s+)?)?(?:${first.verb}|${gerund})`;
  const not = `(?:never|do not|don['\u2019]t)\\s+${first.verb}`;
  const active = `\\b(?:${before}|${not})\\b[^.;]*\\b${noun}\\b`;
  const passive = `\\bbefore\\b[^.;]*\\b${noun}\\s+(?:is|are)\\s+(?:${doubled}ed|${first.verb}ed|${first.verb}n?)\\b`;
  return [{ step, noun, pattern: new RegExp(`${active}|${passive}`, 'i') }];
}

/** Whether a run that is at `from` can come to `to` without a stop. */
function canFollow(to: Step, from: Step, graphs: readonly RunGraph[]): boolean {
  return graphs.some((graph) => {
    const queue: RunPlace[] = graph.places.filter(({ step }) => step === from);
    const seen = new Set(queue);
    for (const place of queue) {
      for (const edge of place.out) {
        if (edge.way.kind === 'stop' || seen.has(edge.to)) continue;
        if (edge.to.step === to) return true;
        seen.add(edge.to);
        queue.push(edge.to);
      }
    }
    return false;
  });
}
