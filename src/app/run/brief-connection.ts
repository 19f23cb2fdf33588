import type { SyncView } from '../core/sync-view';

/** Where sending stands, as short as a chip in the run's header allows. Being offline is no fault. */
export function briefConnection({ isReached, waiting, heldUpBy }: SyncView): string {
  const count = waiting.events + waiting.evidence + waiting.documents;
  const kept = count === 0 ? 'all sent' : `${count} kept`;
  if (heldUpBy === 'sign-in') return `sign in to send \u00b7 ${kept}`;
  return isReached === false ? `Offline \u00b7 ${kept}` : kept;
}
