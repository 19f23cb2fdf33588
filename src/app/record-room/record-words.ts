import type { RunState } from '../../../procedures/engine/showing';

/** A run's status as it is said. */
export const statusWords: Readonly<Record<RunState['status'], string>> = {
  open: 'open',
  'set-aside': 'set aside',
  stopped: 'stopped',
  'lead-called': 'waits for the lead',
  closed: 'closed',
  signed: 'signed',
};
