import type { Step } from '../procedure-document';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/** How often one run may measure the same again, and how often it may come back to mend: more is no diagnosis. */
export const mostRepeats = 3;
export const mostRounds = 5;

/** Bounds of branches that allow more rounds than a person should go. */
export function looseBounds({ document }: LintSubject): readonly LintFinding[] {
  return document.steps.flatMap((step, place) =>
    branchesOf(step).flatMap(({ to, atMost }, index): LintFinding[] => {
      const isRepeat = to === step.id;
      const most = isRepeat ? mostRepeats : mostRounds;
      if (atMost === undefined || atMost <= most) return [];
      const why = isRepeat ? `a measurement is repeated at most ${most} times` : `at most ${most} rounds are gone`;
      const message = `${stepWords(step)}, branch ${index + 1}: may be taken ${atMost} times; ${why}. Lower \`atMost\`, and say in \`thenceforth\` what then.`;
      return [{ rule: 'bounded-loops', step: step.id, pointer: `/steps/${place}/next/${index}/atMost`, message }];
    }),
  );
}

function branchesOf(step: Step): NonNullable<Exclude<Step, { kind: 'finding' }>['next']> {
  return step.kind === 'finding' ? [] : (step.next ?? []);
}
