import type { JudgedResult } from '../../../procedures/document';

/** What a bead or a mark can show: a judged result, or only that something was done or could not be measured. */
export type ShownResult = JudgedResult | 'done' | 'not-measured';

/** The words for each result, the same everywhere. */
export const resultWords: Readonly<Record<ShownResult, string>> = {
  in: 'in band',
  out: 'out of band',
  'too-close': 'too close to call',
  done: 'done',
  'not-measured': 'not measured',
};
