import { afterTheRepair } from './after-the-repair';
import { coldMorning } from './cold-morning';
import { hotIdleWhistle } from './hot-idle-whistle';
import type { PracticeScenario } from './practice-scenario';
import { wholeKilopascals } from './whole-kilopascals';

/** Every scenario, in the order in which they get harder. */
export const practiceScenarios: readonly PracticeScenario[] = [
  hotIdleWhistle,
  coldMorning,
  afterTheRepair,
  wholeKilopascals,
];

/** The scenario that a practice run belongs to, by its header's visit; undefined for one that is no longer there. */
export function scenarioOfVisit(visitId: string): PracticeScenario | undefined {
  return practiceScenarios.find((scenario) => scenario.visitId === visitId);
}
