import type { FindingResult } from '../../../procedures/document';

/** What a bead or a mark can show: a finding's result, or only that something was done or could not be measured. */
export type ShownResult = FindingResult | 'done' | 'not-measured';

/** The words for each result, the same everywhere. */
export const resultWords: Readonly<Record<ShownResult, string>> = {
  in: 'in band',
  out: 'out of band',
  'too-close': 'too close to call',
  'not-judged': 'not judged',
  done: 'done',
  'not-measured': 'not measured',
};
