import type { RunHeader } from '../../../procedures/engine/showing';
import { scenarioOfVisit } from '../shared/practice/practice-scenarios';

/** The log that the practice bench offers for a practice run's ramp; undefined for real work. */
export function practiceRamp(
  header: RunHeader | undefined,
): { readonly path: string; readonly fileName: string } | undefined {
  return header?.kind === 'practice' ? scenarioOfVisit(header.visitId)?.ramp : undefined;
}
