import type { Branch, Exit } from '../procedure-document';
import type { Renaming } from './prefixed-names';

export function renamedExit<T extends Exit>(exit: T, { step, template }: Renaming): T {
  return {
    ...exit,
    to: exit.to === 'verdict' ? exit.to : step(exit.to),
    because: template(exit.because),
    ...(exit.verdict === undefined ? {} : { verdict: step(exit.verdict) }),
  };
}

export function renamedBranch(branch: Branch, renaming: Renaming): Branch {
  return {
    ...renamedExit(branch, renaming),
    when: renaming.expression(branch.when),
    ...(branch.thenceforth === undefined ? {} : { thenceforth: renamedExit(branch.thenceforth, renaming) }),
  };
}
