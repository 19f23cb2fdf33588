import { decisionsOf, type Decision } from './decision/decisions';
import { casesDrawn } from './decision/try-cases';
import { stepWords, type LintFinding, type LintSubject } from './lint-finding';

/**
 * Decisions held to "for every case exactly one exit". The list is ordered and ends in `otherwise`, so every case has
 * one; what is looked for is an exit that no case has (an error), and a figure that was left out of both sides (a
 * warning).
 */
export function exitFindings(subject: LintSubject): {
  readonly errors: readonly LintFinding[];
  readonly warnings: readonly LintFinding[];
} {
  const errors: LintFinding[] = [];
  const warnings: LintFinding[] = [];
  for (const decision of decisionsOf(subject)) {
    decision.branches.forEach((_, index) => {
      const taken = decision.cases.taken(index);
      if (taken === 'never') errors.push(neverTaken(decision, index));
      if (taken === 'unlikely') warnings.push(unlikely(decision, index));
    });
    if (decision.cases.missesOnlyPoints()) warnings.push(leftOut(decision));
  }
  return { errors, warnings };
}

function neverTaken({ step, pointer, branches, cases }: Decision, index: number): LintFinding {
  const why = cases.whyNever(index);
  const words =
    why === 'never-holds'
      ? `its condition (${branches[index]?.when ?? ''}) never holds here. Mend the condition, or take the branch out.`
      : why === 'behind-several'
        ? 'the branches before it take every case in which it holds. Move it up, or take it out.'
        : `branch ${why.behind + 1} (${branches[why.behind]?.when ?? ''}) takes every case in which it holds. Move it up, or take it out.`;
  const message = `${stepWords(step)}, branch ${index + 1}: is never taken: ${words}`;
  return { rule: 'one-exit', step: step.id, pointer: `${pointer}/next/${index}`, message };
}

function unlikely({ step, pointer }: Decision, index: number): LintFinding {
  const message = `${stepWords(step)}, branch ${index + 1}: of ${casesDrawn} cases that were drawn none takes it, and there are too many to go through. Give a part of the conditions a step of its own.`;
  return { rule: 'one-exit', step: step.id, pointer: `${pointer}/next/${index}`, message };
}

function leftOut({ step, pointer }: Decision): LintFinding {
  const message = `${stepWords(step)}: of all readings only one that lies exactly on a figure goes on by \`otherwise\`. Say to which side the figure belongs: write <= or >= in one of the branches.`;
  return { rule: 'one-exit', step: step.id, pointer: `${pointer}/otherwise`, message };
}
