import type { CompiledProcedure } from '../../../../procedures/document';
import type { RunEventData } from '../../../../procedures/engine/showing';
import { lowerFirst } from '../../../../procedures/engine/showing';

/** Where a way leads, as a sentence: the step, and the finding that the run then heads for. */
export function waySentence(
  procedure: Pick<CompiledProcedure, 'step'>,
  { to, verdict }: Pick<RunEventData['branch-taken'], 'to' | 'verdict'>,
): string {
  const target = procedure.step(to);
  const finding = verdict === undefined ? undefined : procedure.step(verdict)?.title;
  if (target === undefined) return '';
  if (target.kind === 'finding') return `The test ends here with the finding: ${lowerFirst(target.title)}.`;
  const next = `It goes on with step ${target.number}, ${lowerFirst(target.title)}`;
  return finding === undefined ? `${next}.` : `${next}; the finding so far: ${lowerFirst(finding)}.`;
}
