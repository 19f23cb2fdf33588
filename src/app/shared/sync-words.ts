import { clockTime } from '../core/time-words';
import type { SyncView } from '../core/sync-view';

/** How loud a chip is: quiet, worth a look, or in need of someone. */
export type SyncTone = 'quiet' | 'live' | 'out';

/** Where sending stands, in a few words. Being offline is no fault and stays quiet. */
export function syncWords(view: SyncView): { readonly text: string; readonly tone: SyncTone } {
  const { waiting, progress } = view;
  const count = waiting.events + waiting.evidence + waiting.documents;
  const kept = count === 0 ? 'everything kept here' : `${count} kept`;
  if (waiting.refused > 0) return { text: `${waiting.refused} refused by the server`, tone: 'out' };
  if (view.heldUpBy === 'sign-in') return { text: `Sign in again to send · ${kept}`, tone: 'live' };
  if (view.heldUpBy === 'tablet') return { text: 'Tablet not registered', tone: 'live' };
  if (view.unreachedSince !== undefined) {
    return { text: `Offline since ${clockTime(view.unreachedSince)} · ${kept}`, tone: 'quiet' };
  }
  if (progress) return { text: `Synced ${progress.done} of ${progress.of}`, tone: 'quiet' };
  if (count > 0) return { text: `${count} kept, to be sent`, tone: 'quiet' };
  if (view.lastSyncAt !== undefined) return { text: `All sent ${clockTime(view.lastSyncAt)}`, tone: 'quiet' };
  return { text: 'Not yet synced', tone: 'quiet' };
}
