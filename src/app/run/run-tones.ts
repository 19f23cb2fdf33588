import type { JudgedResult } from '../../../procedures/document';
import type { RunState } from '../../../procedures/engine/showing';
import type { ToneName } from './tones';

const worstFirst: readonly JudgedResult[] = ['out', 'too-close', 'in'];

/** What is to be heard after a command: a limit before all, else the worst of what was judged anew. */
export function toneAfter(before: RunState | undefined, after: RunState): ToneName | undefined {
  if (after.alarm !== undefined && after.alarm.seq !== before?.alarm?.seq) return 'limit';
  const results = Object.values(after.values)
    .filter(({ seq }) => seq > (before?.seq ?? 0))
    .flatMap(({ judgement }) => judgement?.result ?? []);
  return worstFirst.find((result) => results.includes(result));
}
