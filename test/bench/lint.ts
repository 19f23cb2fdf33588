import { lintProcedure } from '../../procedures/document/authoring';
import { longProcedure } from '../../procedures/document/testing/long-procedure';
import { atMost, type Report } from './budget';
import { measure, timing } from './measure';

const findings = 8;

/** The lint of the longest procedure that the schema takes, and of one a tenth as long. */
export function benchLint(): Report {
  const documents = [50, 500].map((steps) => longProcedure(steps - findings - 3, findings));
  for (const document of documents) {
    const { errors } = lintProcedure(document);
    if (errors.length > 0) throw new Error(errors[0]?.message);
  }
  const timings = measure(
    documents.map((document) => ({
      name: `lint, ${document.steps.length} steps`,
      units: document.steps.length,
      work: () => lintProcedure(document),
    })),
    { rounds: 5, warmUp: 2 },
  );
  const [short, long] = [timing(timings, 'lint, 50 steps'), timing(timings, 'lint, 500 steps')];
  return {
    timings,
    budgets: [
      atMost('lint: seconds for 500 steps', 1, (long.perUnitNs * long.units) / 1e9),
      atMost('lint: cost of 10x the steps', 11, (10 * long.perUnitNs) / short.perUnitNs),
    ],
  };
}
