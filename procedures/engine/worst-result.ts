import type { JudgedResult } from '../document';

const severity: readonly JudgedResult[] = ['in', 'too-close', 'out'];

/** The result that counts where several were judged; undefined for none. */
export function worstOf(results: readonly JudgedResult[]): JudgedResult | undefined {
  return results.reduce<JudgedResult | undefined>(
    (worst, result) => (worst === undefined || severity.indexOf(result) > severity.indexOf(worst) ? result : worst),
    undefined,
  );
}
