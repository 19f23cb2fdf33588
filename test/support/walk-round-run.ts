import { v7 as uuidv7 } from 'uuid';
import { roundTo } from '../../procedures/engine/testing/walk-round-walk';
import { demoSites } from '../../server/database/demo/demo-garage';
import { sent, type SentRun, type Writer } from './test-run';

/** A walk-round up to a step, as a tablet sends it. */
export function sentRound(stepId: string, writer: Writer): SentRun {
  const header = { runId: uuidv7(), visitId: uuidv7(), siteId: demoSites[0]?.id ?? '' };
  return sent(roundTo(stepId, header), writer);
}
