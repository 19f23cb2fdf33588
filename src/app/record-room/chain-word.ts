import { verifyChain, type RunEvent, type RunHeader } from '../../../procedures/engine/showing';
import type { BranchCountersignature } from './record-wire';
import { clockTime } from '../core/time-words';
import { dayText, momentOf } from './record-time';

/** The server's name for the line that a record tells. */
const mainLine = 'main';

/** What can be said of a record's chain after computing it again. */
export interface ChainWord {
  readonly isWhole: boolean;
  /** For the chip: `Chain whole · 214 events · countersigned 11:04`. */
  readonly text: string;
  /** What does not hold, and since which event; or what is not covered yet. */
  readonly detail: string | undefined;
}

/**
 * Computes every hash of the chain again and holds the server's countersignatures against it: each names an event by
 * its hash, so a chain that was rewritten as a whole no longer fits them.
 */
export function wordOfChain(
  header: RunHeader,
  events: readonly RunEvent[],
  countersigned: readonly BranchCountersignature[],
): ChainWord {
  const verdict = verifyChain(header, events);
  if (!verdict.ok) {
    return { isWhole: false, text: `Chain broken at event ${verdict.seq}`, detail: `${capital(verdict.what)}.` };
  }
  const own = countersigned.filter(({ branch }) => branch === undefined || branch === mainLine);
  const strange = own.find(({ seq, head }) => events[seq - 1]?.hash !== head);
  if (strange !== undefined) {
    const detail = `The server countersigned another event ${strange.seq} on ${dayText(momentOf(strange.at))}, ${clockTime(momentOf(strange.at))}.`;
    return { isWhole: false, text: 'Chain differs from the countersigned one', detail };
  }
  return { isWhole: true, ...coverage(events, own) };
}

function coverage(
  events: readonly RunEvent[],
  countersigned: readonly BranchCountersignature[],
): Pick<ChainWord, 'text' | 'detail'> {
  const whole = `Chain whole \u00b7 ${events.length} events`;
  const last = countersigned.reduce<BranchCountersignature | undefined>(
    (newest, entry) => (newest === undefined || entry.seq > newest.seq ? entry : newest),
    undefined,
  );
  if (last === undefined) return { text: `${whole} \u00b7 not countersigned yet`, detail: undefined };
  const uncovered = events.length - last.seq;
  const detail = uncovered > 0 ? `The newest ${uncovered} events are not countersigned yet.` : undefined;
  return { text: `${whole} \u00b7 countersigned ${clockTime(momentOf(last.at))}`, detail };
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
